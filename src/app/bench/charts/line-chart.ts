import type { ElementRef } from '@angular/core';
import {
  ChangeDetectionStrategy,
  Component,
  DOCUMENT,
  DestroyRef,
  afterNextRender,
  effect,
  inject,
  input,
  signal,
  viewChild,
} from '@angular/core';
import type { Chart, ChartDataset } from 'chart.js';
import { Light } from '../../core/light';
import { drawTags, type Tag } from './draw-tags';
import { inksOf, type Ink } from './inks';

export interface ChartPoint {
  readonly x: number;
  readonly y: number;
}

/** One line, or points where `points` is set. */
export interface ChartLine {
  readonly label: string;
  readonly ink: Ink;
  readonly points: readonly ChartPoint[];
  readonly as?: 'line' | 'dashed' | 'steps' | 'dots' | 'mark';
  /** Written beside the first of its points. */
  readonly tag?: string;
}

/** A chart in the hand of the house: few lines, no animation. What it shows is said in words beside it; `label` names it. */
@Component({
  selector: 'oriel-line-chart',
  template: '<canvas #canvas role="img" [attr.aria-label]="label()"></canvas>',
  styles:
    ':host { display: block; position: relative; min-width: 0; height: 150px; } canvas { position: absolute; inset: 0; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LineChart {
  readonly label = input.required<string>();
  readonly lines = input.required<readonly ChartLine[]>();
  readonly xLabel = input('');
  readonly yLabel = input('');
  readonly xRange = input<readonly [number, number] | null>(null);
  /** The least that the upper end of the scale shows, so that quiet lines look quiet. */
  readonly yLeast = input(0);
  /** The ends of the scale where they are fixed, the lower one first; whole figures are written. Downward where the first is the greater. */
  readonly yRange = input<readonly [number, number] | null>(null);

  /** The upper end of the scale at most: what is beyond runs off the top. */
  readonly yMost = input<number | null>(null);

  private readonly canvas = viewChild.required<ElementRef<HTMLCanvasElement>>('canvas');
  private readonly light = inject(Light);
  private readonly window = inject(DOCUMENT).defaultView!;
  private readonly chart = signal<Chart | null>(null);
  private readonly systemLight = signal(0);
  private tags: readonly Tag[] = [];
  private over = false;

  constructor() {
    const system = this.window.matchMedia?.('(prefers-color-scheme: dark)');
    const turned = () => this.systemLight.update((count) => count + 1);
    system?.addEventListener('change', turned);
    inject(DestroyRef).onDestroy(() => {
      this.over = true;
      system?.removeEventListener('change', turned);
      this.chart()?.destroy();
    });
    afterNextRender(() => void this.begin());
    effect(() => this.draw());
  }

  private async begin(): Promise<void> {
    const { Chart } = await import('./chart-parts');
    if (this.over) return;
    this.chart.set(
      new Chart(this.canvas().nativeElement, {
        type: 'scatter',
        data: { datasets: [] },
        options: {
          animation: false,
          parsing: false,
          normalized: true,
          responsive: true,
          maintainAspectRatio: false,
          events: [],
          plugins: { tooltip: { enabled: false } },
        },
        plugins: [{ id: 'tags', afterDatasetsDraw: (chart) => drawTags(chart, this.tags) }],
      }),
    );
  }

  private draw(): void {
    const chart = this.chart();
    const lines = this.lines();
    const range = this.xRange();
    this.light.choice();
    this.systemLight();
    if (!chart) return;
    const inks = inksOf(this.canvas().nativeElement);
    const ticks = {
      color: inks.pencil,
      font: { family: 'Instrument Sans', size: 11 },
      maxTicksLimit: 5,
      maxRotation: 0,
    };
    const scale = (text: string) => ({
      ticks,
      grid: { color: inks.hairline, tickLength: 4 },
      border: { color: inks.line },
      title: { display: text !== '', text, color: inks.pencil, font: ticks.font },
    });
    chart.options.scales = {
      x: { type: 'linear', ...scale(this.xLabel()), ...(range ? { min: range[0], max: range[1] } : {}) },
      y: { type: 'linear', ...scale(this.yLabel()), ...this.upright(ticks) },
    };
    this.tags = lines.flatMap(({ tag, points: [at], ink }) => (tag && at ? [{ words: tag, at, ink: ink === 'brass-line' ? inks.pencil : inks[ink], paper: inks.sheet }] : []));
    chart.data.datasets = lines.map((line) => datasetOf(line, inks[line.ink], inks.sheet));
    chart.update('none');
  }

  private upright(ticks: object) {
    const range = this.yRange();
    const most = this.yMost();
    if (!range) return { min: 0, suggestedMax: this.yLeast(), ...(most === null ? {} : { max: Math.max(most, this.yLeast()) }) };
    const [min, max] = [Math.min(...range), Math.max(...range)];
    return {
      min,
      max,
      reverse: range[0] > range[1],
      ticks: { ...ticks, stepSize: 1, maxTicksLimit: max - min + 1, precision: 0, autoSkip: false },
    };
  }
}

function datasetOf({ label, points, as = 'line' }: ChartLine, colour: string, paper: string): ChartDataset<'scatter'> {
  const drawn = as === 'line' || as === 'dashed' || as === 'steps';
  return {
    label,
    data: points as { x: number; y: number }[],
    showLine: drawn,
    borderColor: colour,
    borderWidth: drawn ? 1.5 : 2,
    borderDash: as === 'dashed' ? [5, 4] : [],
    backgroundColor: as === 'mark' ? colour : paper,
    stepped: as === 'steps',
    pointRadius: drawn ? 0 : as === 'mark' ? 6 : 2,
    spanGaps: false,
  };
}
