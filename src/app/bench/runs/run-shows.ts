import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { judgedBy, WELL_SHOWN, type RunShows } from '@oriel/shared/replay/what-it-shows';
import { parts, partWords } from './run-shows-words';

/** How much of a run there is to judge it by: rest, and motion either way, each as a bar that is full where there is enough. */
@Component({
  selector: 'oriel-run-shows',
  template: `
    @for (part of shown(); track part.name) {
      <li>
        <span>{{ part.name }}</span>
        <span class="bar"><span [class.enough]="part.enough" [style.width.%]="part.percent"></span></span>
        <span class="marginal figures">{{ part.words }}</span>
      </li>
    }
  `,
  styles: `
    :host { display: grid; gap: 8px; width: 100%; margin: 0; padding: 0; list-style: none; }
    li { display: grid; gap: 3px; }
    .bar { height: 4px; background: var(--hairline); }
    .bar > span { display: block; height: 100%; background: var(--brass-line); transition: width var(--ease); }
    .bar > .enough { background: var(--clear); }
  `,
  host: { role: 'list' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RunShowsList {
  readonly shows = input.required<RunShows>();
  protected readonly shown = computed(() => {
    const shows = this.shows();
    return parts.map(({ key, name }) => ({
      name,
      words: partWords(shows, key),
      percent: Math.min(100, (100 * shows[key]) / WELL_SHOWN[key]),
      enough: judgedBy(shows, key) === 'well',
    }));
  });
}
