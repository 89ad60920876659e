import { expect, type Page } from '@playwright/test';
import type { Desk } from './desk';
import { codeOn, shownLayers } from './screen';

/** A screen in a context of its own, paired with a new wall that shows this scene. */
export async function pairedWall(desk: Desk, screen: Page, name: string, sceneName: string) {
  const scenes = await desk.scenes();
  const scene = scenes.find(({ document }) => document.name === sceneName)!;
  // Of the demo's own, for others come and go meanwhile.
  const other = scenes.find(({ document }) => document.name === 'Seeds before the wind')!;
  const wall = await desk.newWall(name, scene.id);
  await screen.goto('/wall');
  await desk.pair(wall.id, await codeOn(screen));
  await expect(shownLayers(screen)).toHaveCount(scene.document.layers.length, { timeout: 20_000 });
  return { wall, scene, other };
}
