/** Shares of red, green and blue in luma (ITU-R BT.601), of 256. */
const [red, green, blue] = [77, 150, 29];

let canvas: HTMLCanvasElement | null = null;

/** The video's present picture in grey; read on this page and nowhere else. */
export function greyOf(video: HTMLVideoElement): { grey: Uint8Array; width: number; height: number } {
  const { videoWidth: width, videoHeight: height } = video;
  canvas ??= document.createElement('canvas');
  canvas.width = width;
  canvas.height = height;
  const context = canvas.getContext('2d', { willReadFrequently: true })!;
  context.drawImage(video, 0, 0);
  const { data } = context.getImageData(0, 0, width, height);
  const grey = new Uint8Array(width * height);
  for (let i = 0; i < grey.length; i++) grey[i] = (red * data[4 * i] + green * data[4 * i + 1] + blue * data[4 * i + 2]) >> 8;
  return { grey, width, height };
}
