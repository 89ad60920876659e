import { DOCUMENT, Injectable, inject, signal } from '@angular/core';

const storageKey = 'oriel.following';

/** Whether the picture follows the viewer's face: as chosen in this browser; until then yes, unless the system asks for less motion. */
@Injectable({ providedIn: 'root' })
export class FollowingChoice {
  /** Whether the system asks for less motion. */
  readonly still = inject(DOCUMENT).defaultView!.matchMedia('(prefers-reduced-motion: reduce)').matches;
  private readonly chosen = signal(this.kept());
  readonly on = this.chosen.asReadonly();

  choose(on: boolean): void {
    localStorage.setItem(storageKey, on ? 'on' : 'off');
    this.chosen.set(on);
  }

  private kept(): boolean {
    const text = localStorage.getItem(storageKey);
    return text === 'on' || (text !== 'off' && !this.still);
  }
}
