import { DomainFailure } from '../http/failure';

export const nothingOpaque = (name: string) =>
  new DomainFailure(
    422,
    'nothing-opaque',
    `Everything in “${name}” is transparent.`,
    'Choose an image in which something can be seen.',
  );

export const photosNotHere = (missing: readonly string[]) =>
  new DomainFailure(
    422,
    'photo-not-here',
    missing.length === 1
      ? 'A photo chosen is no longer in this household.'
      : `${missing.length} of the photos chosen are no longer in this household.`,
    'Choose among the photos that are there; look in the bin for the others.',
    { detail: { photoIds: missing } },
  );

export const imagesNotHere = (layers: readonly number[]) =>
  new DomainFailure(
    422,
    'image-not-here',
    'A layer shows an image that does not belong to this household.',
    'Remove the layers marked, or give each of them an image again.',
    { fields: Object.fromEntries(layers.map((index) => [`document.layers.${index}.image`, 'This image is not here'])) },
  );

export const layersAlike = (index: number) =>
  new DomainFailure(
    400,
    'layers-alike',
    'Two layers carry the same mark.',
    'Reload the page; if it keeps happening, duplicate the layer anew.',
    {
      fields: { [`document.layers.${index}.id`]: 'Used twice' },
    },
  );

export const inBin = () =>
  new DomainFailure(404, 'in-bin', 'This scene is in the bin.', 'Take it out of the bin to open it.');
