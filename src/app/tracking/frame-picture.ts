import type { Picture } from './picture';
import { RgbaPicture } from './rgba-picture';
import { YuvPicture, yuvMatrix, type YuvLayout } from './yuv-picture';

const YUV_FORMATS: readonly (string | null)[] = ['I420', 'NV12'];

/**
 * Turns frames into pictures. Camera frames are copied as they are, planes of luma and colour, and only the pieces looked at become
 * red, green and blue: a quarter of the time of drawing the frame to a canvas. Frames of another kind go through a canvas.
 * The buffer is kept, so a picture is good until the next `read`.
 */
export class FrameReader {
  private buffer = new Uint8Array(0);
  private canvas: OffscreenCanvas | null = null;

  /** The picture of a frame; the frame stays the caller's to close. */
  async read(image: VideoFrame | ImageBitmap): Promise<Picture> {
    if ('format' in image && YUV_FORMATS.includes(image.format)) return this.readPlanes(image);
    return this.readThroughCanvas(image);
  }

  private async readPlanes(frame: VideoFrame): Promise<Picture> {
    const size = frame.allocationSize();
    if (this.buffer.length < size) this.buffer = new Uint8Array(size);
    const planes = await frame.copyTo(this.buffer);
    const { width, height } = frame.visibleRect ?? { width: frame.codedWidth, height: frame.codedHeight };
    const interleaved = planes.length === 2;
    const layout: YuvLayout = {
      lumaAt: planes[0].offset,
      lumaStride: planes[0].stride,
      blueAt: planes[1].offset,
      redAt: interleaved ? planes[1].offset + 1 : planes[2].offset,
      chromaStride: planes[1].stride,
      chromaStep: interleaved ? 2 : 1,
    };
    const standard = frame.colorSpace.matrix === 'bt709' ? 'bt709' : 'bt601';
    return new YuvPicture(width, height, this.buffer, layout, yuvMatrix(standard, frame.colorSpace.fullRange ?? false));
  }

  private readThroughCanvas(image: VideoFrame | ImageBitmap): Picture {
    const width = 'displayWidth' in image ? image.displayWidth : image.width;
    const height = 'displayHeight' in image ? image.displayHeight : image.height;
    if (this.canvas?.width !== width || this.canvas.height !== height) this.canvas = new OffscreenCanvas(width, height);
    const context = this.canvas.getContext('2d', { willReadFrequently: true });
    if (!context) throw new Error('No canvas to read the camera with.');
    context.drawImage(image, 0, 0);
    return new RgbaPicture(width, height, context.getImageData(0, 0, width, height).data);
  }
}
