import { ChangeDetectionStrategy, Component, type ElementRef, effect, inject, input, signal, viewChild } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { Icon } from '../../core/icon/icon';
import { WalkPast } from '../walk/walk-past';
import { DepthView } from './depth-view';
import { Elevation } from './elevation';
import { HoldPaper } from './hold-paper';
import { observedSize } from '../../drawing/observed-size';
import { SheetView } from './sheet-view';
import { TitleBlock } from './title-block';

/** The sheet on a small screen: the elevation stays, plan, section and title block are swiped beneath it. */
@Component({
  selector: 'oriel-sheet-panes',
  imports: [Elevation, DepthView, TitleBlock, WalkPast, HoldPaper, MatIconButton, Icon],
  template: `
    <div class="above" #above orielHoldPaper>
      @if (view.ready()) {
        @let elevation = view.layout().elevation;
        <oriel-elevation
          [frame]="elevation"
          [style.width.px]="elevation.width"
          [style.height.px]="elevation.height"
          [style.transform]="'translate(' + view.offset().x + 'px,' + view.offset().y + 'px)'"
        />
      }
      @if (view.zoom() !== 1) {
        <button matIconButton class="fit" type="button" (click)="view.fit()" aria-label="Fit the elevation"><oriel-icon name="fit" /></button>
      }
    </div>
    <oriel-walk-past />
    <div class="tabs" role="group" aria-label="Drawing shown beneath">
      @for (pane of panes; track pane) {
        <button type="button" [class.here]="shown() === $index" [attr.aria-pressed]="shown() === $index" (click)="swipeTo($index)">{{ pane }}</button>
      }
    </div>
    <div class="beneath" #beneath (scroll)="noteShown()">
      <div class="pane">
        @if (view.ready()) {
          <oriel-depth-view data-testid="plan" [frame]="view.layout().plan" [elevation]="null" />
        }
      </div>
      <div class="pane">
        @if (view.ready()) {
          <oriel-depth-view data-testid="section" [frame]="view.layout().section" [elevation]="null" />
        }
      </div>
      <div class="pane title"><oriel-title-block [revision]="revision()" /></div>
    </div>
  `,
  styles: `
    :host { display: grid; grid-template-rows: auto auto auto minmax(0, 1fr); height: 100%; background: var(--sheet); }
    .above { position: relative; height: min(34dvh, 62vw); overflow: hidden; }
    oriel-elevation { position: absolute; left: 0; top: 0; }
    .fit { position: absolute; right: 4px; top: 4px; background: var(--sheet); }
    .above { touch-action: none; }
    oriel-walk-past { padding: 0 16px; }
    .tabs { display: flex; border-bottom: 1px solid var(--hairline); padding: 0 8px; }
    .tabs button { min-height: 44px; padding: 0 14px; border: 0; background: none; font: inherit; color: var(--pencil); border-bottom: 2px solid transparent; }
    .tabs button.here { color: var(--ink); font-weight: 600; border-bottom-color: var(--brass-line); }
    .beneath { display: flex; overflow: auto hidden; scroll-snap-type: x mandatory; scrollbar-width: none; }
    .pane { flex: 0 0 100%; scroll-snap-align: start; scroll-snap-stop: always; overflow: hidden; }
    .pane.title { overflow: auto; padding: 12px 16px; }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SheetPanes {
  readonly revision = input('');
  protected readonly view = inject(SheetView);
  protected readonly panes = ['Plan', 'Section', 'Title block'];
  protected readonly shown = signal(0);
  private readonly above = viewChild<ElementRef<HTMLElement>>('above');
  private readonly beneath = viewChild<ElementRef<HTMLElement>>('beneath');
  private readonly aboveSize = observedSize(() => this.above());
  private readonly beneathSize = observedSize(() => this.beneath());

  constructor() {
    effect((onCleanup) => {
      const [elevation, pane] = [this.aboveSize(), this.beneathSize()];
      this.view.panes.set(elevation.width > 0 && pane.width > 0 ? { elevation, pane } : null);
      onCleanup(() => this.view.panes.set(null));
    });
  }

  protected swipeTo(index: number): void {
    const element = this.beneath()?.nativeElement;
    element?.scrollTo({ left: index * element.clientWidth, behavior: 'smooth' });
    this.shown.set(index);
  }

  protected noteShown(): void {
    const element = this.beneath()?.nativeElement;
    if (element) this.shown.set(Math.round(element.scrollLeft / Math.max(element.clientWidth, 1)));
  }
}
