import type { Chart } from 'chart.js';
import type { ChartPoint } from './line-chart';
import { placeTags } from './place-tags';

/** Words beside a point of a chart. */
export interface Tag {
  readonly words: string;
  readonly at: ChartPoint;
  readonly ink: string;
  readonly paper: string;
}

const HEIGHT_PX = 12;

/** Writes each beside its point, where it is on none of the others and within the chart. */
export function drawTags({ ctx, scales, chartArea }: Chart, tags: readonly Tag[]): void {
  if (!tags.length) return;
  ctx.save();
  ctx.font = `600 ${HEIGHT_PX}px 'Instrument Sans', sans-serif`;
  ctx.textBaseline = 'top';
  ctx.lineJoin = 'round';
  ctx.lineWidth = 4;
  const wanted = tags.map(({ words, at }) => ({
    x: scales['x'].getPixelForValue(at.x),
    y: scales['y'].getPixelForValue(at.y),
    width: ctx.measureText(words).width,
    height: HEIGHT_PX,
  }));
  placeTags(wanted, chartArea).forEach(({ left, top }, i) => {
    ctx.strokeStyle = tags[i].paper;
    ctx.fillStyle = tags[i].ink;
    ctx.strokeText(tags[i].words, left, top);
    ctx.fillText(tags[i].words, left, top);
  });
  ctx.restore();
}
