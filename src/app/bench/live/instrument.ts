import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { LineChart } from '../charts/line-chart';
import { type Reading, SHOWN_MS } from './instruments';

/** One instrument: the number that matters large, its spread, what is good, and the last half minute. */
@Component({
  selector: 'oriel-instrument',
  imports: [LineChart],
  template: `
    @let shown = reading();
    <div class="words">
      <h2>{{ shown.name }}</h2>
      <p class="figures">
        <span class="figure">{{ shown.figure }}</span> {{ shown.unit }}
        @if (shown.standing; as standing) {
          <span class="standing" [class]="standing.is">{{ standing.words }}</span>
        }
      </p>
      <p class="spread figures">{{ shown.spread }}</p>
      <p class="marginal">{{ shown.good }}</p>
    </div>
    <div>
      <oriel-line-chart
        [label]="shown.name + ', the last half minute'"
        [lines]="shown.lines"
        [xRange]="range"
        [yLabel]="shown.yLabel"
        [yLeast]="shown.yLeast"
        [yMost]="shown.yMost ?? null"
        [yRange]="shown.yRange ?? null"
        xLabel="seconds; 0 is now"
      />
      @if (shown.lines.length > 1) {
        <ul class="key marginal">
          @for (line of shown.lines; track line.label) {
            <li>
              <span
                class="stroke"
                [class.dashed]="line.as === 'dashed'"
                [style.border-color]="'var(--' + line.ink + ')'"
              ></span
              >{{ line.label }}
            </li>
          }
        </ul>
      }
      @if (shown.steps) {
        <ol class="marginal">
          @for (step of shown.steps; track step.words) {
            <li [class.now]="step.now">{{ step.words }}{{ step.now ? ': now' : '' }}</li>
          }
        </ol>
      }
    </div>
  `,
  styleUrl: './instrument.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Instrument {
  readonly reading = input.required<Reading>();
  protected readonly range = [-SHOWN_MS / 1000, 0] as const;
}
