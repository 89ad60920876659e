import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { WallKeeper } from '../set-up/wall-keeper';
import { type Source, meansWords, sourcesOf } from './sources';

/** Under a measured figure: how sure it is, and what that means on the glass. */
@Component({
  selector: 'oriel-means',
  template: `<p class="means figures" [class.assumed]="source()?.assumed" role="status">{{ words() }}</p>`,
  styles: '.means { margin: 4px 0 0; font-size: 12.5px; line-height: 1.4; color: var(--pencil); max-width: 52ch; } .assumed { color: var(--brass-text); }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Means {
  readonly of = input.required<Source['key']>();

  private readonly keeper = inject(WallKeeper);
  protected readonly source = computed(() => {
    const setUp = this.keeper.setUp();
    return setUp && sourcesOf(setUp).find(({ key }) => key === this.of());
  });
  protected readonly words = computed(() => {
    const setUp = this.keeper.setUp();
    const source = this.source();
    return setUp && source ? meansWords(setUp, source) : '';
  });
}
