import { ChangeDetectionStrategy, Component, DOCUMENT, DestroyRef, inject, input } from '@angular/core';
import { keepAwake } from '../player/keep-awake';
import { PairingScreen } from './pairing-screen';
import { SelfCare } from './self-care';
import { WallDevice } from './wall-device';
import { WallEvents } from './wall-events';
import { WallPicture } from './wall-picture';
import { WallReporter } from './wall-reporter';

/** The page of a screen on a wall: its picture, or the code that pairs it. It runs by itself for months. */
@Component({
  selector: 'oriel-wall',
  imports: [PairingScreen, WallPicture],
  providers: [WallDevice, WallEvents, WallReporter, SelfCare],
  template: `
    @if (device.showing(); as showing) {
      <oriel-wall-picture [showing]="showing" [draw]="draw()" />
    } @else {
      <oriel-pairing-screen [unpaired]="device.unpaired()" [unanswered]="device.trouble()" (paired)="device.open()" />
    }
  `,
  styles: `
    :host { position: fixed; inset: 0; background: #000; color-scheme: dark; cursor: none; }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Wall {
  /** `css` or `three` in the query `?draw=`, to compare them. */
  readonly draw = input<string>();
  protected readonly device = inject(WallDevice);

  constructor() {
    const awake = keepAwake(inject(DOCUMENT));
    const unwatch = inject(SelfCare).watch();
    this.device.open();
    inject(DestroyRef).onDestroy(() => {
      awake();
      unwatch();
      this.device.close();
    });
  }
}
