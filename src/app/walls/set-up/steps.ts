import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import { unseenWords } from '../room/zone-seen';
import { sourcesOf } from '../means/sources';

export const steps = ['glass', 'camera', 'room', 'viewer', 'scene', 'pair'] as const;
export type Step = (typeof steps)[number];

/**
 * Which steps of a wall's set-up are done: what they ask for was measured, and not only assumed; the camera sees the whole of the room; a scene is
 * chosen; a screen is paired.
 */
export function stepsDone(setUp: WallSetUp, pairedAt: string | null): Readonly<Record<Step, boolean>> {
  const measured = new Map(sourcesOf(setUp).map(({ key, assumed }) => [key, !assumed]));
  const all = (...keys: Parameters<typeof measured.get>[0][]) => keys.every((key) => measured.get(key));
  const camera = all('position', 'tilt', 'field');
  return { glass: all('glass'), camera, room: camera && unseenWords(setUp).length === 0, viewer: all('viewer'), scene: setUp.sceneId !== null, pair: pairedAt !== null };
}
