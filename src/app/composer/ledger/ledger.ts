import { ChangeDetectionStrategy, Component, computed, inject, output } from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatTooltip } from '@angular/material/tooltip';
import { Icon } from '../../core/icon/icon';
import { Term } from '../../core/term/term';
import { growLayersToCover, growthToCover } from '../commands/setting-commands';
import { setDepth } from '../commands/layer-commands';
import { depthLimits } from '../commands/limits';
import type { DrawnLayer } from '../layers/drawn-layer';
import { meanings } from '../meanings';
import { SceneStore } from '../scene-store';
import { signedMm } from '../../figures/words';
import { FigureField } from '../../figures/figure-field';
import { LayerFigures } from './layer-figures';
import { RoomForm } from './room-form';

/** What the ledger says of a layer's bleed: a word, and whether it is enough. */
interface BleedWords {
  readonly words: string;
  readonly short: boolean;
}

/** The layers and the room as figures, the farthest layer first. */
@Component({
  selector: 'oriel-ledger',
  imports: [MatButton, MatIconButton, MatTooltip, Icon, Term, FigureField, LayerFigures, RoomForm],
  templateUrl: './ledger.html',
  styleUrl: './ledger.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Ledger {
  readonly addLayers = output();
  protected readonly store = inject(SceneStore);
  protected readonly meanings = meanings;
  protected readonly limits = computed(() => depthLimits(this.store.document()));
  protected readonly growth = computed(() => (this.store.faults().length > 0 ? growthToCover(this.store.document()) : 1));
  protected readonly rows = computed(() =>
    this.store.ledger().map((drawn) => ({ drawn, note: noteOf(drawn), bleed: bleedOf(drawn) })),
  );

  protected setDepth(id: string, depthMm: number): void {
    this.store.edit(setDepth(id, depthMm), `depth ${id}`);
  }

  protected toggle(id: string): void {
    this.store.select(this.store.selectedId() === id ? null : id);
  }

  protected grow(): void {
    this.store.edit(growLayersToCover);
  }

  protected percent(factor: number): string {
    return ((factor - 1) * 100).toFixed(1);
  }
}

function noteOf({ layer }: DrawnLayer): string {
  const { image, opacity, shown } = layer;
  const whole = image.width === image.trim.ofWidth && image.height === image.trim.ofHeight;
  const notes = [`${whole ? '' : 'cut out, '}${image.width}\u00a0×\u00a0${image.height}\u00a0px`];
  if (opacity < 1) notes.push(`${Math.round(opacity * 100)} %`);
  if (!shown) notes.unshift('hidden');
  return notes.join(', ');
}

function bleedOf({ bleed, layer }: DrawnLayer): BleedWords {
  if (!bleed) return { words: 'too near', short: true };
  if (bleed.spareMm === null) return { words: 'inside', short: false };
  const short = bleed.spareMm < -1e-6 && layer.shown;
  return { words: signedMm(Math.abs(bleed.spareMm) < 10 ? bleed.spareMm : Math.trunc(bleed.spareMm)), short };
}
