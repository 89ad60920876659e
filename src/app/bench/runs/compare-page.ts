import { ChangeDetectionStrategy, Component, computed, effect, inject, input, signal, untracked } from '@angular/core';
import { RouterLink } from '@angular/router';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { type ChartLine, LineChart } from '../charts/line-chart';
import { compared, overTime } from './compared';
import { RunsStore, type WholeRun } from './runs-store';

/** Two runs beside each other: two settings, or two machines. */
@Component({
  selector: 'oriel-compare-page',
  imports: [RouterLink, FailureNotice, LineChart],
  template: `
    <p><a routerLink="/bench/runs">All runs</a></p>
    <oriel-failure-notice [failure]="loading.failure()" [retryable]="true" (retry)="load()" />
    @if (rows(); as shown) {
      <div class="sides">
        <table>
          <caption class="marginal">
            Two figures are median / 95th percentile.
          </caption>
          <thead>
            <tr>
              <td></td>
              <th scope="col"><span class="stroke a"></span>{{ first()!.run.name }}</th>
              <th scope="col"><span class="stroke b"></span>{{ second()!.run.name }}</th>
            </tr>
          </thead>
          <tbody>
            @for (row of shown; track row.name) {
              <tr>
                <th scope="row">{{ row.name }}</th>
                <td class="figures">{{ row.a }}</td>
                <td class="figures">{{ row.b }}</td>
              </tr>
            }
            <tr>
              <th scope="row">Machine</th>
              <td class="marginal">{{ first()!.run.machine }}</td>
              <td class="marginal">{{ second()!.run.machine }}</td>
            </tr>
          </tbody>
        </table>
        <div>
          <h2>Between looks</h2>
          <oriel-line-chart
            label="Time between looks of both runs"
            [lines]="intervals()"
            xLabel="s"
            yLabel="ms"
            [yLeast]="60"
          />
          <h2>Time for one look</h2>
          <oriel-line-chart
            label="Time for one look of both runs"
            [lines]="totals()"
            xLabel="s"
            yLabel="ms"
            [yLeast]="20"
          />
        </div>
      </div>
    } @else if (!loading.failure()) {
      <p role="status">Fetching both runs.</p>
    }
  `,
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
  protected readonly intervals = computed(() => this.overlaid('interval'));
  protected readonly totals = computed(() => this.overlaid('totalMs'));

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
