import type { Point2, ViewingZone } from '@oriel/shared/projection/types';
import { sidesOf } from './across';
import type { DepthFrame } from './frames';
import { drawnAt } from './placing';

/** How far a value lies outside of a range; 0 within it. */
export const outside = (value: number, least: number, most: number) => Math.max(least - value, value - most, 0);

/** The side of the zone's rectangle in plan or section that lies nearest to a point, within reach; null where none does. */
export function zoneSideAt(frame: DepthFrame, point: Point2, zone: ViewingZone, reachPx: number): keyof ViewingZone | null {
  const { low, high } = sidesOf(frame.view);
  const a = drawnAt(frame, { across: zone[low], z: zone.nearestMm });
  const b = drawnAt(frame, { across: zone[high], z: zone.farthestMm });
  const [alongPoint, acrossPoint] = frame.view === 'plan' ? [point.y, point.x] : [point.x, point.y];
  const [alongNear, alongFar] = frame.view === 'plan' ? [a.y, b.y] : [a.x, b.x];
  const [acrossLow, acrossHigh] = frame.view === 'plan' ? [a.x, b.x] : [a.y, b.y];
  const beside = outside(acrossPoint, Math.min(acrossLow, acrossHigh), Math.max(acrossLow, acrossHigh));
  const beyond = outside(alongPoint, alongNear, alongFar);
  const sides: { side: keyof ViewingZone; px: number }[] = [
    { side: 'nearestMm', px: Math.hypot(alongPoint - alongNear, beside) },
    { side: 'farthestMm', px: Math.hypot(alongPoint - alongFar, beside) },
    { side: low, px: Math.hypot(acrossPoint - acrossLow, beyond) },
    { side: high, px: Math.hypot(acrossPoint - acrossHigh, beyond) },
  ];
  const [nearest] = sides.filter(({ px }) => px <= reachPx).sort((p, q) => p.px - q.px);
  return nearest?.side ?? null;
}
