import { DOCUMENT, Injectable, computed, inject, signal } from '@angular/core';
import { ScreenSetUp, isOfThisScreen, usualSetUp } from './screen-set-up';

const storageKey = 'oriel.screen';

/** The set-up of the screen this browser is on: what was measured, or the usual measures until then. */
@Injectable({ providedIn: 'root' })
export class ThisScreen {
  private readonly window = inject(DOCUMENT).defaultView!;
  private readonly kept = signal(this.read());
  readonly setUp = computed(() => this.kept() ?? usualSetUp(this.window));
  /** Whether someone measured this screen, or chose to go without. */
  readonly decided = computed(() => this.kept() !== null);

  keep(setUp: ScreenSetUp): void {
    localStorage.setItem(storageKey, JSON.stringify(setUp));
    this.kept.set(setUp);
  }

  /** What is kept, if it can be understood and was measured on this screen. */
  private read(): ScreenSetUp | null {
    try {
      const parsed = ScreenSetUp.safeParse(JSON.parse(localStorage.getItem(storageKey) ?? 'null'));
      return parsed.success && isOfThisScreen(parsed.data, this.window) ? parsed.data : null;
    } catch {
      return null;
    }
  }
}
