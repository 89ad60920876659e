import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type GlyphName, glyphs } from './glyphs';

/** A glyph beside words; it says nothing by itself to assistive technology, so the control that holds it needs a name. */
@Component({
  selector: 'oriel-icon',
  template: '<svg viewBox="0 -960 960 960" aria-hidden="true"><path [attr.d]="path()" /></svg>',
  styles: ':host { display: inline-flex; width: 1.35em; height: 1.35em; flex: none; } svg { width: 100%; height: 100%; fill: currentColor; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Icon {
  readonly name = input.required<GlyphName>();
  protected readonly path = computed(() => glyphs[this.name()]);
}
