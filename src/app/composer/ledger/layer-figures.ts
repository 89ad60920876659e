import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MatTooltip } from '@angular/material/tooltip';
import { shiftInPixels, shiftOverZone } from '@oriel/shared/projection/zone-shift';
import { Icon } from '../../core/icon/icon';
import { newId } from '../../core/new-id';
import { Term } from '../../core/term/term';
import { hideLayer, place, renameLayer, setOpacity, setWidth, showLayer } from '../commands/layer-commands';
import { duplicateLayer, removeLayer, reorderLayer } from '../commands/stack-commands';
import type { DrawnLayer } from '../layers/drawn-layer';
import { meanings } from '../meanings';
import { SceneStore } from '../scene-store';
import { plainMm } from '../../figures/words';
import { FigureField } from '../../figures/figure-field';

/** The longer side of the screen a shift is stated for until a wall is known, px. */
const SCREEN_PX = 1920;

/** The selected layer's figures, and what can be done with it. */
@Component({
  selector: 'oriel-layer-figures',
  imports: [FigureField, MatIconButton, MatTooltip, Icon, Term],
  templateUrl: './layer-figures.html',
  styleUrl: './layer-figures.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LayerFigures {
  readonly drawn = input.required<DrawnLayer>();
  protected readonly store = inject(SceneStore);
  protected readonly layer = computed(() => this.drawn().layer);
  protected readonly id = computed(() => this.layer().id);

  /** How far the layer moves on the glass across the zone: in mm, and in pixels of a screen `SCREEN_PX` long. */
  protected readonly shift = computed(() => {
    const { glass, homeEye, zone } = this.store.document();
    if (!this.drawn().plane) return null;
    const mm = shiftOverZone(this.layer().depthMm, homeEye, zone);
    const px = shiftInPixels(mm, SCREEN_PX / Math.max(glass.widthMm, glass.heightMm));
    return { mm: plainMm(Math.abs(mm.across)), px: Math.abs(px.across).toFixed(0) };
  });
  protected readonly meanings = meanings;
  protected readonly screenPx = SCREEN_PX;

  protected rename(name: string): void {
    this.store.edit(renameLayer(this.id(), name));
  }

  protected across(xMm: number): void {
    this.store.edit(place(this.id(), xMm, this.layer().placed.yMm), `x ${this.id()}`);
  }

  protected up(yMm: number): void {
    this.store.edit(place(this.id(), this.layer().placed.xMm, yMm), `y ${this.id()}`);
  }

  protected width(widthMm: number): void {
    this.store.edit(setWidth(this.id(), widthMm), `width ${this.id()}`);
  }

  protected height(heightMm: number): void {
    const { placed } = this.layer();
    this.store.edit(setWidth(this.id(), (heightMm * placed.widthMm) / placed.heightMm), `width ${this.id()}`);
  }

  protected opacity(percent: number): void {
    this.store.edit(setOpacity(this.id(), percent / 100), `opacity ${this.id()}`);
  }

  protected showOrHide(): void {
    this.store.edit(this.layer().shown ? hideLayer(this.id()) : showLayer(this.id()));
  }

  protected duplicate(): void {
    const copyId = newId();
    this.store.edit(duplicateLayer(this.id(), copyId));
    this.store.select(copyId);
  }

  protected remove(): void {
    this.store.edit(removeLayer(this.id()));
  }

  protected reorder(by: number): void {
    this.store.edit(reorderLayer(this.id(), by));
  }
}
