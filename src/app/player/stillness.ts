import { signal } from '@angular/core';

/** Whether someone has moved pointer or keys of late: what decides when the controls and the cursor are seen. */
export class Stillness {
  private timer: ReturnType<typeof setTimeout> | undefined;
  private readonly movedOfLate = signal(true);
  readonly moved = this.movedOfLate.asReadonly();

  constructor(private readonly afterMs: number) {
    this.stir();
  }

  stir(): void {
    this.movedOfLate.set(true);
    clearTimeout(this.timer);
    this.timer = setTimeout(() => this.movedOfLate.set(false), this.afterMs);
  }

  stop(): void {
    clearTimeout(this.timer);
  }
}
