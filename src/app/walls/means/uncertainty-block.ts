import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import { errorsOf, exampleDepths, sayError, sourcesOf, together, worthMeasuring } from './sources';

/** The title block of a wall's drawing: what is not certain about it, and what each uncertainty means on the glass. */
@Component({
  selector: 'oriel-uncertainty-block',
  template: `
    <section aria-label="How sure the set-up is">
      <table class="figures">
        <caption>
          <span class="title">{{ setUp().name }}</span>
          <span>How far off a layer may be drawn, mm on the glass, seen from the middle of the zone</span>
        </caption>
        <thead>
          <tr>
            <th scope="col">Known to</th>
            @for (depth of depths; track depth) {
              <th scope="col">{{ depth }} mm behind</th>
            }
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track row.key) {
            <tr [class.assumed]="row.assumed">
              <th scope="row">{{ row.words }}{{ row.assumed ? ', assumed' : '' }}</th>
              @for (error of row.errors; track $index) {
                <td>{{ error }}</td>
              }
            </tr>
          }
        </tbody>
        <tfoot>
          <tr>
            <th scope="row">All together</th>
            @for (error of all(); track $index) {
              <td>{{ error }}</td>
            }
          </tr>
        </tfoot>
      </table>
      @if (blind()) {
        <p class="blind">The camera does not see the middle of the viewing zone: turn it there, or move the zone.</p>
      }
      @if (next(); as words) {
        <p class="next">{{ words }}</p>
      }
      <p class="marginal">Standard uncertainties: about one time in three it is more.</p>
    </section>
  `,
  styleUrl: './uncertainty-block.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UncertaintyBlock {
  readonly setUp = input.required<WallSetUp>();

  protected readonly depths = exampleDepths;
  private readonly sources = computed(() => sourcesOf(this.setUp()));
  protected readonly rows = computed(() =>
    this.sources().map(({ key, words, assumed, unsure }) => ({ key, words, assumed, errors: said(errorsOf(this.setUp(), unsure)) })),
  );
  private readonly sum = computed(() => errorsOf(this.setUp(), together(this.sources())));
  protected readonly all = computed(() => said(this.sum()));
  protected readonly next = computed(() => worthMeasuring(this.setUp()));
  protected readonly blind = computed(() => this.sum() === null);
}

const said = (errors: readonly number[] | null) => (errors ?? exampleDepths.map(() => null)).map((error) => (error === null ? '–' : `±${sayError(error)}`));
