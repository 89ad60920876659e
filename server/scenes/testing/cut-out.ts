import sharp from 'sharp';

/** A transparent picture with one opaque rectangle in it, as PNG. */
export const cutOut = (
  size: { width: number; height: number },
  part: { left: number; top: number; width: number; height: number },
  colour = '#c08030',
): Promise<Buffer> =>
  sharp({ create: { ...size, channels: 4, background: { r: 0, g: 0, b: 0, alpha: 0 } } })
    .composite([
      {
        input: { create: { width: part.width, height: part.height, channels: 3, background: colour } },
        left: part.left,
        top: part.top,
      },
    ])
    .png()
    .toBuffer();
