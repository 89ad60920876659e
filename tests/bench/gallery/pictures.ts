import { mkdtemp, readdir } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { inProject } from '../../../scripts/project.mjs';

/** Shapes as cameras and phones make them, width by height. */
const shapes: readonly (readonly [number, number])[] = [[3, 2], [4, 3], [2, 3], [3, 4], [16, 9], [1, 1], [9, 16], [5, 2]];
const longEdgePx = 1600;
/** Numbers spread over 0 to 1, the same at each run. */
const spread = (i: number, by: number): number => (i * by) % 1;

/** So many distinct JPEG files, cut from the demo's photographs at different places, sizes and hues; the folder is the caller's to remove. */
export async function makePictures(count: number): Promise<{ folder: string; files: string[] }> {
  const photos = inProject('assets', 'demo', 'photos');
  const sources = (await readdir(photos)).sort();
  const folder = await mkdtemp(join(tmpdir(), 'oriel-gallery-'));
  const files: string[] = [];
  for (let i = 0; i < count; i++) {
    const upright = await sharp(join(photos, sources[i % sources.length])).rotate().toBuffer({ resolveWithObject: true });
    const { width, height } = upright.info;
    const [across, up] = shapes[i % shapes.length];
    const fit = Math.min(width / across, height / up) * (0.5 + 0.45 * spread(i, 0.37));
    const [w, h] = [Math.floor(across * fit), Math.floor(up * fit)];
    const file = join(folder, `picture-${i}.jpg`);
    await sharp(upright.data)
      .extract({ left: Math.floor((width - w) * spread(i, 0.61)), top: Math.floor((height - h) * spread(i, 0.29)), width: w, height: h })
      .resize(longEdgePx, longEdgePx, { fit: 'inside' })
      .modulate({ hue: (i * 47) % 360, brightness: 0.8 + 0.4 * spread(i, 0.43) })
      .jpeg({ quality: 82 })
      .toFile(file);
    files.push(file);
  }
  return { folder, files };
}
