import { SIDE_AXIS, sideOf } from '@oriel/shared/projection/sides';
import type { Glass, Point3, Rectangle, ViewingZone } from '@oriel/shared/projection/types';
import type { DepthFrame } from './frames';

type View = DepthFrame['view'];

/** The coordinate that a view shares with the elevation: x in the plan, y in the section. */
export const acrossOf = (view: View, { x, y }: { readonly x: number; readonly y: number }): number => (view === 'plan' ? x : y);

/** An eye with that coordinate and its distance changed. */
export const withAcross = (view: View, eye: Point3, across: number, z: number): Point3 =>
  view === 'plan' ? { ...eye, x: across, z } : { ...eye, y: across, z };

/** The sides of the zone that bound a view across. */
export const sidesOf = (view: View): { low: keyof ViewingZone; high: keyof ViewingZone } =>
  view === 'plan' ? { low: 'leftMm', high: 'rightMm' } : { low: 'lowestMm', high: 'highestMm' };

/** From where to where a rectangle reaches across, mm. */
export const spanAcross = (view: View, rectangle: Rectangle): [number, number] =>
  view === 'plan' ? [sideOf(rectangle, 'left'), sideOf(rectangle, 'right')] : [sideOf(rectangle, 'bottom'), sideOf(rectangle, 'top')];

/** From where to where the glass reaches across, mm. */
export function glassAcross(view: View, glass: Glass): [number, number] {
  const half = (SIDE_AXIS[view === 'plan' ? 'right' : 'top'].axis === 'x' ? glass.widthMm : glass.heightMm) / 2;
  return [-half, half];
}
