import { ChangeDetectionStrategy, Component, computed, effect, inject, input, signal, untracked } from '@angular/core';
import { RouterLink } from '@angular/router';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { type ChartLine, LineChart } from '../charts/line-chart';
import { tuningDifferences } from '../tuning/tuning-words';
import { compared, overTime } from './compared';
import { slowerWords } from './slower';
import { MachineWords } from './machine-words';
import { RunsStore, type WholeRun } from './runs-store';

/** Two runs beside each other: two settings, or two machines. */
@Component({
  selector: 'oriel-compare-page',
  imports: [RouterLink, FailureNotice, LineChart, MachineWords],
  templateUrl: './compare-page.html',
  styleUrl: './compare-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComparePage {
  /** The two runs' ids, from the address. */
  readonly a = input<string>();
  readonly b = input<string>();

  private readonly runs = inject(RunsStore);
  protected readonly loading = new Submission();
  protected readonly first = signal<WholeRun | null>(null);
  protected readonly second = signal<WholeRun | null>(null);
  protected readonly rows = computed(() => {
    const [first, second] = [this.first(), this.second()];
    return first && second && compared(first, second);
  });
  /** Where one run's machine was plainly slower. */
  protected readonly slower = computed(() => {
    const [first, second] = [this.first(), this.second()];
    return first && second ? slowerWords(first, second) : '';
  });
  /** The settings the two were recorded with, where they differ. */
  protected readonly settings = computed(() => {
    const [first, second] = [this.first(), this.second()];
    return first && second ? tuningDifferences(first.run.tuning, second.run.tuning) : [];
  });
  protected readonly charts = computed(() => [
    { name: 'Between looks', good: 'Good: a steady line under 67 ms, which is 15 looks a second.', row: 'Between looks, ms', yLeast: 80, lines: this.overlaid('interval') },
    { name: 'Time for one look', good: 'Good: under 33 ms, so that a camera of 30 a second is looked at whole.', row: 'One look, ms', yLeast: 40, lines: this.overlaid('totalMs') },
  ].map((chart) => ({ ...chart, figures: this.rows()?.find(({ name }) => name === chart.row) })));

  constructor() {
    effect(() => {
      if (this.a() && this.b()) untracked(() => void this.load());
    });
  }

  protected load(): Promise<void> {
    return this.loading.run(async () => {
      const [first, second] = await Promise.all([this.runs.read(this.a() ?? ''), this.runs.read(this.b() ?? '')]);
      this.first.set(first);
      this.second.set(second);
    });
  }

  private overlaid(figure: 'interval' | 'totalMs'): ChartLine[] {
    return ([this.first(), this.second()] as const).flatMap((whole, i) =>
      whole
        ? [{ label: whole.run.name, ink: i ? 'near' : 'ink', points: overTime(whole, figure) } satisfies ChartLine]
        : [],
    );
  }
}
