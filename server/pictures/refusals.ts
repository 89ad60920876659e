import { photoMaxPixels } from '@oriel/shared/contracts/photos';
import { DomainFailure } from '../http/failure';

const readable = 'JPEG, PNG, WebP, AVIF, TIFF, GIF or HEIC';

export const notAPicture = () =>
  new DomainFailure(
    415,
    'not-a-picture',
    'This file is not a picture that Oriel can read.',
    `Choose a ${readable} file. What is inside decides, not the name.`,
  );
export const noFile = () =>
  new DomainFailure(400, 'no-file', 'No file arrived.', 'Choose a picture and send it again.');
export const truncated = () =>
  new DomainFailure(
    422,
    'truncated',
    'This picture is cut short or damaged: it cannot be read to its end.',
    'Copy it again from the camera, the phone or the disk it came from.',
  );
export const tooManyPixels = (width: number, height: number) =>
  new DomainFailure(
    413,
    'too-many-pixels',
    `This picture says it is ${width} by ${height} pixels: more than the ${photoMaxPixels / 1e6} megapixels Oriel takes.`,
    'Make it smaller and send it again.',
  );
