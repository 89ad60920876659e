import type { Page } from '@playwright/test';
import sharp from 'sharp';
import type { Layer, LayerImage, Scene, SceneDocument } from '@oriel/shared/contracts/scenes';
import { ask, householdId } from '../asking';

/** The glass of the test's screen, mm. */
export const glass = { widthMm: 640, heightMm: 360 };
export const homeEye = { x: 0, y: 180, z: 700 };
export const ground = [40, 60, 80] as const;

/** Discs at depths: where the home eye sees their middles, mm, and how wide. */
export const discs = [
  { name: 'Behind, left', depthMm: 300, xMm: -100, yMm: 60, widthMm: 36, colour: [230, 60, 60] },
  { name: 'Behind, right', depthMm: 300, xMm: 110, yMm: 85, widthMm: 36, colour: [70, 220, 90] },
  { name: 'A little behind', depthMm: 100, xMm: 5, yMm: 60, widthMm: 36, colour: [240, 240, 240] },
  { name: 'In front', depthMm: -60, xMm: 0, yMm: -60, widthMm: 36, colour: [250, 220, 60] },
] as const;

const picture = async (width: number, height: number, svg: string) =>
  `data:image/png;base64,${(await sharp(Buffer.from(`<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}">${svg}</svg>`)).png().toBuffer()).toString('base64')}`;

const rgb = (colour: readonly number[]) => `rgb(${colour.join(',')})`;

/** Makes the scene as a designer would: images uploaded, layers placed, saved. */
export async function makeFollowScene(page: Page): Promise<Scene> {
  const { scene } = await ask<{ scene: Scene }>(page, 'POST', `/api/households/${await householdId(page)}/scenes`, { name: 'Discs', photoIds: [] });
  const upload = async (data: string) => (await ask<{ image: LayerImage }>(page, 'POST', `/api/scenes/${scene.id}/images`, data)).image;
  const layer = (name: string, image: LayerImage, depthMm: number, placed: Layer['placed']): Layer => ({
    id: crypto.randomUUID(), name, image, depthMm, placed, opacity: 1, shown: true,
  });
  const layers = [layer('Ground', await upload(await picture(64, 48, `<rect width="64" height="48" fill="${rgb(ground)}"/>`)), 600, { xMm: 0, yMm: 0, widthMm: 1920, heightMm: 1440 })];
  for (const { name, depthMm, xMm, yMm, widthMm, colour } of discs) {
    const image = await upload(await picture(200, 200, `<circle cx="100" cy="100" r="100" fill="${rgb(colour)}"/>`));
    layers.push(layer(name, image, depthMm, { xMm, yMm, widthMm, heightMm: widthMm }));
  }
  const document: SceneDocument = {
    name: 'Discs', glass, homeEye, layers,
    zone: { leftMm: -200, rightMm: 200, lowestMm: -100, highestMm: 300, nearestMm: 400, farthestMm: 1200 },
  };
  return (await ask<{ scene: Scene }>(page, 'PUT', `/api/scenes/${scene.id}`, { revision: scene.revision, document })).scene;
}
