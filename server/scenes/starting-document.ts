import { randomUUID } from 'node:crypto';
import type { SceneDocument } from '@oriel/shared/contracts/scenes';
import { placeTrimmed } from '@oriel/shared/projection/cover-glass';
import { farthestOfNewMm, livingRoom } from '@oriel/shared/projection/living-room';
import type { NamedImage } from './layer-images';

/** Depths from the farthest to the glass, evenly; a single layer lies in the glass. */
const spread = (index: number, count: number) =>
  count === 1 ? 0 : Math.round(farthestOfNewMm * (1 - index / (count - 1)));

/** What a scene is when it is made: each picture covers the glass, the first the farthest; the glass lies or stands as the first picture does. */
export function startingDocument(name: string, pictures: readonly NamedImage[]): SceneDocument {
  const first = pictures[0]?.image.trim;
  const setting = livingRoom(first && first.ofHeight > first.ofWidth ? 'portrait' : 'landscape');
  return {
    name,
    ...setting,
    layers: pictures.map(({ image, name: layerName }, index) => ({
      id: randomUUID(),
      name: layerName,
      image,
      depthMm: spread(index, pictures.length),
      placed: placeTrimmed(setting.glass, image),
      opacity: 1,
      shown: true,
    })),
  };
}
