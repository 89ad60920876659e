import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import type { ViewingZone } from '@oriel/shared/projection/types';
import { FigureField } from '../../figures/figure-field';
import { zoneSideWords } from '../../figures/words';
import { WallKeeper } from './wall-keeper';

const sides = ['nearestMm', 'farthestMm', 'leftMm', 'rightMm', 'lowestMm', 'highestMm'] as const;
/** An eye stands before the glass. */
const nearestEyeMm = 100;
const mostMm = 100_000;

/** The third step: the viewing zone, typed here or dragged on the drawing. */
@Component({
  selector: 'oriel-wall-room-step',
  imports: [FigureField],
  template: `
    @let zone = keeper.setUp()!.zone;
    <fieldset>
      <legend>Where people’s eyes are</legend>
      <p class="what">
        From the centre of the glass: left and lower are negative. Drag a side of the zone in the plan or the section, or type it. An eye is about 120 mm
        below the top of a head.
      </p>
      @for (side of sides; track side) {
        <oriel-figure-field
          [label]="words[side]"
          [step]="10"
          [value]="zone[side]"
          [least]="side === 'nearestMm' || side === 'farthestMm' ? nearest : -most"
          [most]="most"
          [readOnly]="!keeper.mayTune()"
          (figure)="keeper.zone(part(side, $event))"
        />
      }
      @for (problem of problems(); track problem) {
        <p class="problem" role="alert">{{ problem }}. Nothing is saved until then.</p>
      }
    </fieldset>
    @if (problems().length === 0) {
      <p class="what">
        {{ across() }} m across and {{ deep() }} m deep. A scene says whether it is clear from the whole of the zone; a larger zone asks more of its layers.
      </p>
    }
  `,
  styleUrl: './step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RoomStep {
  protected readonly keeper = inject(WallKeeper);
  protected readonly sides = sides;
  protected readonly words = zoneSideWords;
  protected readonly nearest = nearestEyeMm;
  protected readonly most = mostMm;
  protected readonly part = (side: keyof ViewingZone, mm: number): Partial<ViewingZone> => ({ [side]: mm });
  protected readonly problems = computed(() =>
    Object.entries(this.keeper.problems()).flatMap(([field, message]) => (field.startsWith('zone.') ? [message] : [])),
  );
  private readonly zone = computed(() => this.keeper.setUp()!.zone);
  protected readonly across = computed(() => ((this.zone().rightMm - this.zone().leftMm) / 1000).toFixed(1));
  protected readonly deep = computed(() => ((this.zone().farthestMm - this.zone().nearestMm) / 1000).toFixed(1));
}
