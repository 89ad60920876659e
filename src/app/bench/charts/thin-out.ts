import type { ChartPoint } from './line-chart';

/** At most about two points for each of `columns` columns, its least and its greatest value, in order of time: no peak is lost. NaN breaks the line. */
export function thinOut(points: readonly ChartPoint[], columns: number): readonly ChartPoint[] {
  if (points.length <= 2 * columns) return points;
  const start = points[0].x;
  const width = (points[points.length - 1].x - start) / columns;
  const thin: ChartPoint[] = [];
  for (let from = 0; from < points.length;) {
    const end = start + width * (Math.floor((points[from].x - start) / width) + 1);
    let least = points[from];
    let greatest = points[from];
    let to = from;
    for (; to < points.length && (points[to].x < end || to === from); to++) {
      if (points[to].y < least.y) least = points[to];
      if (points[to].y > greatest.y) greatest = points[to];
    }
    if (least === greatest) thin.push(least);
    else thin.push(...(least.x < greatest.x ? [least, greatest] : [greatest, least]));
    from = to;
  }
  return thin;
}
