import type { Page } from '@playwright/test';
import sharp from 'sharp';
import type { Layer, LayerImage, Scene, SceneDocument } from '@oriel/shared/contracts/scenes';
import { ask, householdId } from '../../e2e/asking';
import { SIZES, type SizeName } from './options';

/** The glass of the bench's wall, mm; the same whatever its pixels. */
export const glass = { widthMm: 640, heightMm: 360 };
const homeEye = { x: 0, y: 0, z: 700 };
const zone: SceneDocument['zone'] = { leftMm: -300, rightMm: 300, lowestMm: -200, highestMm: 200, nearestMm: 500, farthestMm: 2500 };
const farthestMm = 600;
const nearestMm = -60;

/** A layer's place: the first fills the glass with bleed, the others stand before it, each over a third of the glass and more. */
function placeOf(index: number): Layer['placed'] {
  if (index === 0) return { xMm: 0, yMm: 0, widthMm: glass.widthMm * 1.6, heightMm: glass.heightMm * 1.6 };
  const turn = index * 2.4;
  return { xMm: 150 * Math.cos(turn), yMm: 70 * Math.sin(turn), widthMm: glass.widthMm * 0.6, heightMm: glass.heightMm * 0.6 };
}

/** A picture as fine as this screen can show it: opaque at the back, otherwise an oval with a soft edge, its colour changing across. */
async function pictureOf(index: number, size: SizeName): Promise<string> {
  const { widthMm, heightMm } = placeOf(index);
  const pxPerMm = SIZES[size][0] / glass.widthMm;
  const [width, height] = [Math.round(widthMm * pxPerMm), Math.round(heightMm * pxPerMm)];
  const hue = (index * 47) % 360;
  const [rx, ry] = [width / 2, height / 2];
  const shape = index === 0 ? `<rect width="${width}" height="${height}" fill="url(#c)"/>` : `<ellipse cx="${rx}" cy="${ry}" rx="${rx}" ry="${ry}" fill="url(#c)" mask="url(#m)"/>`;
  const svg = `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}"><defs>
    <linearGradient id="c" x2="1" y2="1"><stop stop-color="hsl(${hue} 60% 35%)"/><stop offset="1" stop-color="hsl(${hue + 60} 50% 65%)"/></linearGradient>
    <radialGradient id="f"><stop offset="0.9" stop-color="#fff"/><stop offset="1" stop-color="#555"/></radialGradient>
    <mask id="m"><rect width="100%" height="100%" fill="url(#f)"/></mask></defs>${shape}</svg>`;
  return `data:image/png;base64,${(await sharp(Buffer.from(svg)).png({ compressionLevel: 3 }).toBuffer()).toString('base64')}`;
}

/** The scenes of the bench, made as a designer would: on a page that is signed in. */
export class BenchScenes {
  private readonly made = new Map<string, Scene>();
  private readonly images = new Map<string, LayerImage>();

  constructor(private readonly page: Page) {}

  /** A scene of so many layers, drawn for a screen of this size. */
  async scene(layers: number, size: SizeName): Promise<Scene> {
    const name = `Bench, ${String(layers)} layers at ${size}`;
    const known = this.made.get(name);
    if (known) return known;
    const { scene } = await ask<{ scene: Scene }>(this.page, 'POST', `/api/households/${await householdId(this.page)}/scenes`, { name, photoIds: [] });
    const drawn: Layer[] = [];
    for (let index = 0; index < layers; index++) {
      const depthMm = farthestMm + ((nearestMm - farthestMm) * index) / Math.max(1, layers - 1);
      drawn.push({ id: crypto.randomUUID(), name: `Layer ${String(index + 1)}`, image: await this.image(scene.id, index, size), depthMm, placed: placeOf(index), opacity: 1, shown: true });
    }
    const document: SceneDocument = { name, glass, homeEye, zone, layers: drawn };
    const saved = (await ask<{ scene: Scene }>(this.page, 'PUT', `/api/scenes/${scene.id}`, { revision: scene.revision, document })).scene;
    this.made.set(name, saved);
    return saved;
  }

  private async image(sceneId: string, index: number, size: SizeName): Promise<LayerImage> {
    const key = `${size} ${String(index)}`;
    const known = this.images.get(key);
    if (known) return known;
    const { image } = await ask<{ image: LayerImage }>(this.page, 'POST', `/api/scenes/${sceneId}/images`, await pictureOf(index, size));
    this.images.set(key, image);
    return image;
  }
}
