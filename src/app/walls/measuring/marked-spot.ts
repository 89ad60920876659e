import { Injectable, computed, signal } from '@angular/core';
import type { Point3 } from '@oriel/shared/projection/types';
import { measured } from '@oriel/shared/viewer/measuring/uncertainty';

/** The spot on the floor that is stood on to measure: one for tilt and for a viewer's scale, since it is taped down once. */
@Injectable()
export class MarkedSpot {
  /** The eye of who stands there, mm from the centre of the glass. */
  readonly eye = signal<Point3>({ x: 0, y: 0, z: 1500 });
  /** Standard uncertainty of each figure, mm. */
  readonly sureMm = signal(15);
  /** Whether a measurement that needs it is open; then it stands on the drawing. */
  readonly wanted = signal(false);
  readonly shown = computed(() => (this.wanted() ? this.eye() : null));
  readonly measured = computed(() => {
    const { x, y, z } = this.eye();
    const u = this.sureMm();
    return { x: measured(x, u), y: measured(y, u), z: measured(z, u) };
  });

  move(part: Partial<Point3>): void {
    this.eye.update((before) => ({ ...before, ...part }));
  }
}
