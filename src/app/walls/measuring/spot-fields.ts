import { ChangeDetectionStrategy, Component, DestroyRef, inject } from '@angular/core';
import { FigureField } from '../../figures/figure-field';
import { MarkedSpot } from './marked-spot';

/** Where the marked spot is; while these figures are open it stands on the drawing. */
@Component({
  selector: 'oriel-spot-fields',
  imports: [FigureField],
  template: `
    <p class="marginal">
      Tape a mark to the floor where the camera sees you well, and stand with your eyes above it. Measure to between your eyes, from the centre of the
      glass.
    </p>
    <oriel-figure-field label="From the glass" [step]="10" [least]="200" [most]="10000" [value]="spot.eye().z" (figure)="spot.move({ z: $event })" />
    <oriel-figure-field label="Right of its centre" [step]="10" [least]="-5000" [most]="5000" [value]="spot.eye().x" (figure)="spot.move({ x: $event })" />
    <oriel-figure-field label="Eyes above its centre" [step]="10" [least]="-3000" [most]="3000" [value]="spot.eye().y" (figure)="spot.move({ y: $event })" />
    <oriel-figure-field label="Each sure to within ±" [least]="1" [most]="200" [value]="spot.sureMm()" (figure)="spot.sureMm.set($event)" />
  `,
  styles: ':host { display: grid; gap: 4px; } p { margin: 0 0 4px; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SpotFields {
  protected readonly spot = inject(MarkedSpot);

  constructor() {
    this.spot.wanted.set(true);
    inject(DestroyRef).onDestroy(() => this.spot.wanted.set(false));
  }
}
