import { spreadOf, type Spread } from '@oriel/shared/replay/spread';
import type { ChartPoint } from '../charts/line-chart';
import { thinOut } from '../charts/thin-out';

const COLUMNS = 90;

/** Figures as they come, the newest kept; taking one in allocates nothing. */
export class Series {
  private readonly tMs: Float64Array;
  private readonly figures: Float64Array;
  private taken = 0;

  constructor(capacity = 2400) {
    this.tMs = new Float64Array(capacity);
    this.figures = new Float64Array(capacity);
  }

  add(tMs: number, figure: number): void {
    const at = this.taken++ % this.tMs.length;
    this.tMs[at] = tMs;
    this.figures[at] = figure;
  }

  /** The figures since a moment, oldest first, as seconds before `nowMs`. */
  points(sinceMs: number, nowMs: number): readonly ChartPoint[] {
    const points: ChartPoint[] = [];
    this.each(sinceMs, (tMs, y) => points.push({ x: (tMs - nowMs) / 1000, y }));
    return thinOut(points, COLUMNS);
  }

  /** Of the figures that are known. */
  spread(sinceMs: number): Spread {
    const figures: number[] = [];
    this.each(sinceMs, (_tMs, figure) => {
      if (!Number.isNaN(figure)) figures.push(figure);
    });
    return spreadOf(figures);
  }

  count(sinceMs: number): number {
    let count = 0;
    this.each(sinceMs, () => count++);
    return count;
  }

  /** NaN of none. */
  mean(sinceMs: number): number {
    let sum = 0;
    this.each(sinceMs, (_tMs, figure) => (sum += figure));
    return sum / this.count(sinceMs);
  }

  private each(sinceMs: number, use: (tMs: number, figure: number) => void): void {
    const capacity = this.tMs.length;
    for (let i = Math.max(0, this.taken - capacity); i < this.taken; i++)
      if (this.tMs[i % capacity] >= sinceMs) use(this.tMs[i % capacity], this.figures[i % capacity]);
  }
}
