import type { SceneDocument } from '@oriel/shared/contracts/scenes';
import type { Extents } from './sheet-layout';

const roundUp = (value: number) => {
  const step = value > 5000 ? 500 : 100;
  return Math.ceil(value / step) * step;
};

/** What of a scene must fit on the sheet, rounded up and with room to drag farther, so that the scale does not change with every step. */
export function extentsOf({ glass, homeEye, zone, layers }: SceneDocument): Extents {
  const farthest = Math.max(0, ...layers.map((layer) => layer.depthMm));
  return {
    glass,
    behindMm: roundUp(Math.max(farthest * 1.15, 0.4 * Math.max(glass.widthMm, glass.heightMm))),
    frontMm: Math.ceil(Math.max(0, ...layers.map((layer) => -layer.depthMm)) / 20) * 20,
    beforeMm: roundUp(Math.max(zone.farthestMm, homeEye.z) * 1.03),
  };
}
