import type { Glass, Rectangle } from './types';

/** An image, and where it lay in the picture it was trimmed from; all in the pixels of that picture. */
export interface TrimmedImage {
  readonly width: number;
  readonly height: number;
  readonly trim: { readonly left: number; readonly top: number; readonly ofWidth: number; readonly ofHeight: number };
}

/** The smallest rectangle of a picture's own shape (width and height in any unit) that covers the glass, centred on it. */
export function coverGlass(glass: Glass, width: number, height: number): Rectangle {
  const mmPerUnit = Math.max(glass.widthMm / width, glass.heightMm / height);
  return { xMm: 0, yMm: 0, widthMm: width * mmPerUnit, heightMm: height * mmPerUnit };
}

/**
 * Where a trimmed image stands when the whole picture it came from covers the glass. Images cut from one photograph keep their
 * places to each other. Pixels count downward from the top left corner, the glass upward from its centre.
 */
export function placeTrimmed(glass: Glass, image: TrimmedImage): Rectangle {
  return placeTrimmedIn(coverGlass(glass, image.trim.ofWidth, image.trim.ofHeight), image);
}

/** Where a trimmed image stands when the whole picture it came from fills the rectangle. */
export function placeTrimmedIn(whole: Rectangle, { width, height, trim }: TrimmedImage): Rectangle {
  const across = whole.widthMm / trim.ofWidth;
  const up = whole.heightMm / trim.ofHeight;
  return {
    xMm: whole.xMm + (trim.left + width / 2 - trim.ofWidth / 2) * across,
    yMm: whole.yMm + (trim.ofHeight / 2 - trim.top - height / 2) * up,
    widthMm: width * across,
    heightMm: height * up,
  };
}
