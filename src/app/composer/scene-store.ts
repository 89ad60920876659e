import { Injectable, computed, signal } from '@angular/core';
import type { SceneDocument } from '@oriel/shared/contracts/scenes';
import { statedFaults } from '../drawing/stated-faults';
import type { Change } from './commands/change';
import { type History, beginHistory, record, redo, undo } from './history';
import { drawLayers } from './layers/drawn-layer';

const TYPING_TOGETHER_MS = 900;

const emptySheet: SceneDocument = {
  name: '',
  glass: { widthMm: 1210, heightMm: 681 },
  homeEye: { x: 0, y: 0, z: 1800 },
  zone: { leftMm: -600, rightMm: 600, lowestMm: -200, highestMm: 300, nearestMm: 1200, farthestMm: 2400 },
  layers: [],
};

/** The scene being composed: its document, what is selected, and every step back and forth. It knows no server. */
@Injectable()
export class SceneStore {
  private readonly history = signal<History>(beginHistory(emptySheet));
  private readonly chosenId = signal<string | null>(null);
  private gestures = 0;

  readonly document = computed(() => this.history().present);
  readonly canUndo = computed(() => !this.readOnly() && this.history().past.length > 0);
  readonly canRedo = computed(() => !this.readOnly() && this.history().future.length > 0);
  /** Whether this person may look but not draw. */
  readonly readOnly = signal(false);
  /** Whether something is being dragged; what depends on the whole waits until it is let go. */
  readonly gesturing = signal(false);

  readonly layers = computed(() => drawLayers(this.document()));
  readonly faults = computed(() => statedFaults(this.document()));
  /** The ledger's order: the farthest first. */
  readonly ledger = computed(() => [...this.layers()].sort((a, b) => a.order - b.order));
  readonly selected = computed(() => this.layers().find(({ layer }) => layer.id === this.chosenId()) ?? null);
  readonly selectedId = computed(() => this.selected()?.layer.id ?? null);

  open(document: SceneDocument): void {
    this.history.set(beginHistory(document));
  }

  select(id: string | null): void {
    this.chosenId.set(id);
  }

  /** One step. Steps with the same `key` in quick succession become one. */
  edit(change: Change, key?: string): void {
    this.take(change, key ? { key, at: Date.now() } : null, TYPING_TOGETHER_MS);
  }

  /** Begins a drag: everything `edit` of the gesture does is one step; `cancel` takes it back. */
  gesture(): Gesture {
    const key = `gesture ${(this.gestures += 1)}`;
    const before = this.history();
    this.gesturing.set(true);
    return {
      edit: (change) => this.take(change, { key, at: 0 }, Infinity),
      end: () => this.gesturing.set(false),
      cancel: () => {
        if (!this.readOnly()) this.history.set(before);
        this.gesturing.set(false);
      },
    };
  }

  undo(): void {
    if (this.canUndo()) this.history.update(undo);
  }

  redo(): void {
    if (this.canRedo()) this.history.update(redo);
  }

  private take(change: Change, joining: History['joining'], withinMs: number): void {
    if (this.readOnly()) return;
    this.history.update((history) => record(history, change(history.present), joining, withinMs));
  }
}

/** A drag in progress. */
export interface Gesture {
  edit(change: Change): void;
  end(): void;
  cancel(): void;
}
