/** The picture is judged in so many parts across and down. */
export const ACROSS = 8;
export const DOWN = 6;
const SIDE = 4;

/** Mean brightness (0 to 255, luma of Rec. 601) of each part of a picture, from a copy a few pixels large that is written over by the next. */
export class Brightness {
  private readonly canvas: HTMLCanvasElement;
  private readonly context: CanvasRenderingContext2D | null;

  constructor(document: Document) {
    this.canvas = document.createElement('canvas');
    this.canvas.width = ACROSS * SIDE;
    this.canvas.height = DOWN * SIDE;
    this.context = this.canvas.getContext('2d', { willReadFrequently: true });
  }

  /** Row by row; null where the picture cannot be read. */
  of(video: HTMLVideoElement): Float64Array | null {
    const { width, height } = this.canvas;
    if (!this.context || !video.videoWidth) return null;
    this.context.drawImage(video, 0, 0, width, height);
    return brightnessOfParts(this.context.getImageData(0, 0, width, height).data, width);
  }
}

/** The same of pixels in hand, four bytes each, `width` a row. */
export function brightnessOfParts(pixels: Uint8ClampedArray, width: number): Float64Array {
  const parts = new Float64Array(ACROSS * DOWN);
  const [partWidth, partHeight] = [width / ACROSS, pixels.length / 4 / width / DOWN];
  for (let at = 0; at < pixels.length; at += 4) {
    const [column, row] = [(at / 4) % width, Math.floor(at / 4 / width)];
    const part = Math.floor(row / partHeight) * ACROSS + Math.floor(column / partWidth);
    parts[part] += (0.299 * pixels[at] + 0.587 * pixels[at + 1] + 0.114 * pixels[at + 2]) / (partWidth * partHeight);
  }
  return parts;
}
