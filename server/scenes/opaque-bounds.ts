import type { Sharp } from 'sharp';

/** A part of an image, px. */
export interface Bounds {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
}

/** Alpha from which something is seen at all, of 255: fainter is what a soft brush leaves behind. */
const seenFrom = 4;

/** The smallest part that holds everything seen in the image; null when it is wholly transparent. */
export async function opaqueBounds(picture: Sharp): Promise<Bounds | null> {
  const { data, info } = await picture
    .ensureAlpha()
    .extractChannel('alpha')
    .raw()
    .toBuffer({ resolveWithObject: true });
  const { width, height } = info;
  const rowIsSeen = (y: number) => data.subarray(y * width, (y + 1) * width).some((alpha) => alpha >= seenFrom);

  let top = 0;
  while (top < height && !rowIsSeen(top)) top++;
  if (top === height) return null;
  let bottom = height - 1;
  while (!rowIsSeen(bottom)) bottom--;

  let left = width;
  let right = -1;
  for (let y = top; y <= bottom; y++) {
    const row = data.subarray(y * width, (y + 1) * width);
    const first = row.subarray(0, left).findIndex((alpha) => alpha >= seenFrom);
    if (first >= 0) left = first;
    const last = row.subarray(right + 1).findLastIndex((alpha) => alpha >= seenFrom);
    if (last >= 0) right += 1 + last;
  }
  return { left, top, width: right - left + 1, height: bottom - top + 1 };
}
