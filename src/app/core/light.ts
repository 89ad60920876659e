import { DOCUMENT, Injectable, effect, inject, signal } from '@angular/core';

export type LightChoice = 'system' | 'day' | 'evening';

const storageKey = 'oriel.light';
const isChoice = (text: string | null): text is LightChoice => text === 'system' || text === 'day' || text === 'evening';

/** Day or evening: as the system has it unless the person chose, kept for this browser. */
@Injectable({ providedIn: 'root' })
export class Light {
  private readonly root = inject(DOCUMENT).documentElement;
  readonly choice = signal<LightChoice>(this.kept());

  constructor() {
    effect(() => {
      const choice = this.choice();
      localStorage.setItem(storageKey, choice);
      if (choice === 'system') this.root.removeAttribute('data-light');
      else this.root.setAttribute('data-light', choice);
    });
  }

  private kept(): LightChoice {
    const text = localStorage.getItem(storageKey);
    return isChoice(text) ? text : 'system';
  }
}
