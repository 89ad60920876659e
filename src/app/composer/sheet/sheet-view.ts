import { Injectable, computed, inject, linkedSignal, signal } from '@angular/core';
import type { Point2 } from '@oriel/shared/projection/types';
import { SceneStore } from '../scene-store';
import { extentsOf } from './extents';
import type { Room } from '../../drawing/frames';
import { type Extents, enlarge, layOutPanes, layOutSheet } from './sheet-layout';

const LARGEST = 12;
const SMALLEST = 0.5;
const STEP = 1.25;
const nowhere: Point2 = { x: 0, y: 0 };

/** How the sheet is laid out, and how it is held: enlarged and moved. Lines and figures keep their size. */
@Injectable()
export class SheetView {
  private readonly store = inject(SceneStore);
  readonly room = signal<Room>({ width: 0, height: 0 });
  /** Room for the two panes of a phone; null on one sheet. */
  readonly panes = signal<{ readonly elevation: Room; readonly pane: Room } | null>(null);
  readonly zoom = signal(1);
  readonly offset = signal<Point2>(nowhere);

  /** Frozen while something is dragged: the scale must not run away under the pointer. */
  private readonly extents = linkedSignal<{ now: Extents; frozen: boolean }, Extents>({
    source: () => ({ now: extentsOf(this.store.document()), frozen: this.store.gesturing() }),
    computation: ({ now, frozen }, before) => (frozen && before ? before.value : now),
    equal: (a, b) =>
      a.behindMm === b.behindMm && a.frontMm === b.frontMm && a.beforeMm === b.beforeMm && a.glass.widthMm === b.glass.widthMm && a.glass.heightMm === b.glass.heightMm,
  });
  private readonly base = computed(() => {
    const panes = this.panes();
    return panes ? layOutPanes(panes.elevation, panes.pane, this.extents()) : layOutSheet(this.room(), this.extents());
  });
  /** Of panes, only the elevation is enlarged. */
  readonly layout = computed(() => {
    const [base, zoom] = [this.base(), this.zoom()];
    if (zoom === 1) return base;
    const enlarged = enlarge(base, zoom);
    return this.panes() ? { ...base, elevation: enlarged.elevation } : enlarged;
  });
  readonly ready = computed(() => (this.panes()?.elevation ?? this.room()).width > 0);

  zoomIn(): void {
    this.zoomAbout(this.middle(), STEP);
  }

  zoomOut(): void {
    this.zoomAbout(this.middle(), 1 / STEP);
  }

  fit(): void {
    this.zoom.set(1);
    this.offset.set(nowhere);
  }

  /** Enlarges so that what lies under `point` stays there. */
  zoomAbout(point: Point2, factor: number): void {
    const before = this.zoom();
    const after = Math.min(Math.max(before * factor, SMALLEST), LARGEST);
    const near = Math.abs(after - 1) < 0.02 ? 1 : after;
    this.zoom.set(near);
    this.offset.update(({ x, y }) => ({
      x: point.x - ((point.x - x) * near) / before,
      y: point.y - ((point.y - y) * near) / before,
    }));
  }

  pan(dx: number, dy: number): void {
    this.offset.update(({ x, y }) => ({ x: x + dx, y: y + dy }));
  }

  private middle(): Point2 {
    const { width, height } = this.panes()?.elevation ?? this.room();
    return { x: width / 2, y: height / 2 };
  }
}
