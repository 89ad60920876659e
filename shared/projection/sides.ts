import type { Glass, Rectangle, ViewingZone } from './types';

/** The four sides of the glass or of a layer, as the viewer sees them. */
export const SIDES = ['left', 'right', 'bottom', 'top'] as const;
export type Side = (typeof SIDES)[number];

/** A figure for each side. */
export type PerSide<T> = Readonly<Record<Side, T>>;

/** Which axis a side bounds, and which way is outward along it. */
export const SIDE_AXIS: PerSide<{ readonly axis: 'x' | 'y'; readonly outward: 1 | -1 }> = {
  left: { axis: 'x', outward: -1 },
  right: { axis: 'x', outward: 1 },
  bottom: { axis: 'y', outward: -1 },
  top: { axis: 'y', outward: 1 },
};

/** One figure a side, from a function of the side. */
export function perSide<T>(figure: (side: Side) => T): PerSide<T> {
  return { left: figure('left'), right: figure('right'), bottom: figure('bottom'), top: figure('top') };
}

/** The position of a rectangle's side along its axis, mm. */
export function sideOf(rectangle: Rectangle, side: Side): number {
  const { axis, outward } = SIDE_AXIS[side];
  return axis === 'x'
    ? rectangle.xMm + (outward * rectangle.widthMm) / 2
    : rectangle.yMm + (outward * rectangle.heightMm) / 2;
}

/** The position of the glass's side along its axis, mm. */
export function sideOfGlass(glass: Glass, side: Side): number {
  const { axis, outward } = SIDE_AXIS[side];
  return (outward * (axis === 'x' ? glass.widthMm : glass.heightMm)) / 2;
}

/** The range of eye positions along an axis, mm. */
export function rangeOf(zone: ViewingZone, axis: 'x' | 'y'): { readonly low: number; readonly high: number } {
  return axis === 'x' ? { low: zone.leftMm, high: zone.rightMm } : { low: zone.lowestMm, high: zone.highestMm };
}
