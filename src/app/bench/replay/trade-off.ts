import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { SearchResult, TriedTuning } from '@oriel/shared/replay/search-tuning';
import { type Wish, wishes } from '@oriel/shared/replay/wishes';
import { WELL_SHOWN } from '@oriel/shared/replay/what-it-shows';
import { plainMm } from '../../figures/words';
import { type ChartLine, LineChart } from '../charts/line-chart';
import { differenceWords } from './difference-words';

/** Jitter at rest against straying in motion, for one direction: the best there is, today's setting, and the one for a wish. */
@Component({
  selector: 'oriel-trade-off',
  imports: [LineChart],
  templateUrl: './trade-off.html',
  styleUrl: './trade-off.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TradeOff {
  readonly found = input.required<SearchResult>();
  readonly wish = input.required<Wish>();
  /** Today's setting where it was changed since the search. */
  readonly now = input<TriedTuning | null>(null);
  /** Whose setting today's is. */
  readonly todayOf = input('');

  protected readonly today = computed(() => this.now() ?? this.found().today);
  protected readonly best = computed(() => this.found().best[this.wish()]);
  protected readonly title = computed(() => titled(this.wish()));
  protected readonly brings = computed(() => differenceWords(this.today(), this.best()));
  protected readonly columns = computed(() => {
    const { best } = this.found();
    return [
      { name: 'Today', of: this.today(), wished: false },
      ...wishes.map((wish) => ({ name: titled(wish), of: best[wish], wished: wish === this.wish() })),
    ];
  });
  protected readonly roughly = computed(() => {
    const { stillMs, movingMs, direction } = this.found();
    return stillMs < WELL_SHOWN.stillMs || movingMs < (direction === 'across' ? WELL_SHOWN.acrossMs : WELL_SHOWN.alongMs);
  });
  protected readonly words = computed(() => `Jitter at rest against straying in motion, ${this.found().direction}`);
  protected readonly lines = computed<ChartLine[]>(() => {
    const [{ curve }, today] = [this.found(), this.today()];
    const point = ({ strayMs, jitterMm }: { strayMs: number; jitterMm: number }) => ({ x: strayMs, y: jitterMm });
    // What lies far beyond the others would squeeze them into a corner.
    const wished = Object.values(this.found().best);
    const x = 1.5 * Math.max(60, today.strayMs, ...wished.map(({ strayMs }) => strayMs));
    const y = 1.2 * Math.max(0.5, today.jitterMm, ...wished.map(({ jitterMm }) => jitterMm));
    const others = wishes.filter((wish) => wish !== this.wish());
    const near = curve.map(point).filter((at) => at.x <= x && at.y <= y);
    return [
      { label: this.title(), ink: 'near', points: [point(this.best())], as: 'mark', tag: titled(this.wish()) },
      { label: 'Today', ink: 'ink', points: [point(today)], as: 'mark', tag: 'Today' },
      ...others.map(
        (wish): ChartLine => ({ label: titled(wish), ink: 'brass-line', points: [point(this.found().best[wish])], as: 'mark', tag: titled(wish) }),
      ),
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

  /** With a true minus, where it runs ahead. */
  protected whole(ms: number): string {
    return Number.isNaN(ms) ? '–' : plainMm(ms, 0);
  }

  protected seconds(ms: number): string {
    return (ms / 1000).toFixed(0);
  }
}

const titled = (wish: Wish): string => wish[0].toUpperCase() + wish.slice(1);
