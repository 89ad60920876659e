import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { SearchResult } from '@oriel/shared/replay/search-tuning';
import { type Wish, wishes } from '@oriel/shared/replay/wishes';
import { type ChartLine, LineChart } from '../charts/line-chart';

/** Jitter at rest against straying in motion, for one direction: the best there is, today's setting, and the one for a wish. */
@Component({
  selector: 'oriel-trade-off',
  imports: [LineChart],
  template: `
    @let result = found();
    <div>
      <oriel-line-chart
        [label]="words()"
        [lines]="lines()"
        [xRange]="xRange()"
        xLabel="off in motion, as ms of the way"
        yLabel="jitter at rest, mm"
      />
      <ul class="marginal">
        <li><span class="dot open"></span>Nothing beats these</li>
        <li><span class="dot today"></span>Today</li>
        <li><span class="dot wished"></span>{{ title() }}</li>
        <li><span class="dot other"></span>The other two wishes</li>
      </ul>
    </div>
    <table>
      <thead>
        <tr>
          <td></td>
          <th scope="col">Today</th>
          <th scope="col">{{ title() }}</th>
        </tr>
      </thead>
      <tbody>
        <tr class="large">
          <th scope="row">Jitter at rest, mm</th>
          <td class="figures">{{ result.today.jitterMm.toFixed(2) }}</td>
          <td class="figures">{{ best().jitterMm.toFixed(2) }}</td>
        </tr>
        <tr class="large">
          <th scope="row">Off in motion, ms</th>
          <td class="figures">{{ result.today.strayMs.toFixed(0) }}</td>
          <td class="figures">{{ best().strayMs.toFixed(0) }}</td>
        </tr>
        <tr>
          <th scope="row">Lag in motion, ms</th>
          <td class="figures">{{ result.today.lagMs.toFixed(0) }}</td>
          <td class="figures">{{ best().lagMs.toFixed(0) }}</td>
        </tr>
        <tr>
          <th scope="row">Cutoff at rest, Hz</th>
          <td class="figures">{{ filterOf(result.today).minCutoffHz }}</td>
          <td class="figures">{{ filterOf(best()).minCutoffHz }}</td>
        </tr>
        <tr>
          <th scope="row">Beta</th>
          <td class="figures">{{ filterOf(result.today).beta }}</td>
          <td class="figures">{{ filterOf(best()).beta }}</td>
        </tr>
        @if (result.direction === 'across') {
          <tr>
            <th scope="row">Looks ahead at most, ms</th>
            <td class="figures">{{ result.today.tuning.longestHorizonMs }}</td>
            <td class="figures">{{ best().tuning.longestHorizonMs }}</td>
          </tr>
        }
      </tbody>
    </table>
    <p class="marginal">
      Judged on {{ seconds(result.stillMs) }} s of standing still and {{ seconds(result.movingMs) }} s of motion.
      @if (alike()) {
        No setting makes much of a difference in this run: what it strays and jitters comes from before the filter, as with few looks a second or a viewer who sways.
      }
    </p>
  `,
  styleUrl: './trade-off.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TradeOff {
  readonly found = input.required<SearchResult>();
  readonly wish = input.required<Wish>();

  protected readonly best = computed(() => this.found().best[this.wish()]);
  protected readonly title = computed(() => this.wish()[0].toUpperCase() + this.wish().slice(1));
  protected readonly words = computed(() => `Jitter at rest against straying in motion, ${this.found().direction}`);
  protected readonly lines = computed<ChartLine[]>(() => {
    const { curve, today } = this.found();
    const point = ({ strayMs, jitterMm }: { strayMs: number; jitterMm: number }) => ({ x: strayMs, y: jitterMm });
    // What lies far beyond the others would squeeze them into a corner.
    const wished = Object.values(this.found().best);
    const x = 1.5 * Math.max(60, today.strayMs, ...wished.map(({ strayMs }) => strayMs));
    const y = 1.2 * Math.max(0.5, today.jitterMm, ...wished.map(({ jitterMm }) => jitterMm));
    const others = wishes.filter((wish) => wish !== this.wish()).map((wish) => point(this.found().best[wish]));
    const near = curve.map(point).filter((at) => at.x <= x && at.y <= y);
    return [
      { label: this.title(), ink: 'near', points: [point(this.best())], as: 'mark' },
      { label: 'Today', ink: 'ink', points: [point(today)], as: 'mark' },
      { label: 'The other two wishes', ink: 'brass-line', points: others, as: 'mark' },
      { label: 'Nothing beats these', ink: 'brass-line', points: near, as: 'dots' },
      { label: 'Between them', ink: 'line', points: near },
    ];
  });

  /** At least 20 ms to either side of what is shown: differences that nobody notices are to look small. */
  protected readonly xRange = computed<readonly [number, number]>(() => {
    const at = this.lines().flatMap(({ points }) => points.map(({ x }) => x));
    return [Math.max(0, 10 * Math.floor(Math.min(...at) / 10) - 20), 10 * Math.ceil(Math.max(...at) / 10) + 20];
  });
  protected readonly alike = computed(() => {
    const { calmer, quicker } = this.found().best;
    return quicker.jitterMm < 1.1 * calmer.jitterMm && calmer.strayMs < 1.1 * quicker.strayMs;
  });

  protected filterOf({ tuning }: { readonly tuning: SearchResult['today']['tuning'] }) {
    return tuning.filter[this.found().direction];
  }

  protected seconds(ms: number): string {
    return (ms / 1000).toFixed(0);
  }
}
