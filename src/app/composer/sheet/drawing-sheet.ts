import { ChangeDetectionStrategy, Component, type ElementRef, computed, effect, inject, input, viewChild } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MatTooltip } from '@angular/material/tooltip';
import { Icon } from '../../core/icon/icon';
import { SceneStore } from '../scene-store';
import { WalkPast } from '../walk/walk-past';
import { DepthView } from './depth-view';
import { Elevation } from './elevation';
import { HoldPaper } from './hold-paper';
import { observedSize } from '../../drawing/observed-size';
import type { Frame } from '../../drawing/frames';
import { SheetView } from './sheet-view';
import { TitleBlock } from './title-block';
import { SheetPanes } from './sheet-panes';

/** The sheet: elevation, plan under it, section beside it, and the title block in its corner. */
@Component({
  selector: 'oriel-drawing-sheet',
  imports: [Elevation, DepthView, TitleBlock, WalkPast, HoldPaper, MatIconButton, MatTooltip, Icon, SheetPanes],
  templateUrl: './drawing-sheet.html',
  styleUrl: './drawing-sheet.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DrawingSheet {
  readonly revision = input('');
  /** Whether there is room for the title block in the corner. */
  readonly withTitle = input(true);
  readonly inPanes = input(false);
  protected readonly view = inject(SheetView);
  private readonly store = inject(SceneStore);
  private readonly paper = viewChild<ElementRef<HTMLElement>>('paper');
  private readonly size = observedSize(() => this.paper());
  /** Whether the title block, grown by faults, or the section of an upright glass, leaves the other little room. */
  protected readonly crowded = computed(() => {
    const { glass } = this.store.document();
    return glass.heightMm > glass.widthMm || this.store.faults().length > 0;
  });
  protected readonly scales = computed(() => {
    const { elevation, plan } = this.view.layout();
    const { pxPerMm, broken } = plan.depth;
    const viewers = broken ? `, viewers 1:${ratio(pxPerMm * broken.beyond)}` : '';
    return `across 1:${ratio(elevation.pxPerMm)}, depth 1:${ratio(pxPerMm)}${viewers}`;
  });

  constructor() {
    effect(() => this.view.room.set(this.size()));
  }

  protected at({ left, top, width, height }: Frame) {
    return { left: `${left}px`, top: `${top}px`, width: `${width}px`, height: `${height}px` };
  }
}

/** CSS pixels are 96 to the inch, so a scale on screen is a ratio of lengths (CSS Values and Units 4). */
const MM_PER_PX = 25.4 / 96;
const ratio = (pxPerMm: number) => {
  const value = 1 / (pxPerMm * MM_PER_PX);
  return value < 10 ? value.toFixed(1) : value.toFixed(0);
};
