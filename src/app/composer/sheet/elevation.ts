import { ChangeDetectionStrategy, Component, ElementRef, computed, effect, inject, input, linkedSignal, signal, viewChild } from '@angular/core';
import type { Point2, Rectangle } from '@oriel/shared/projection/types';
import { place, setWidth } from '../commands/layer-commands';
import { type DrawnLayer, placedPerSeen, seenFrom } from '../layers/drawn-layer';
import { SceneStore } from '../scene-store';
import { Viewer } from '../walk/viewer';
import { plainMm } from '../../figures/words';
import { followPointer } from '../../drawing/follow-pointer';
import { edgeFor } from './image-address';
import { LayerAlpha } from './layer-alpha';
import { LayerPicture } from './layer-picture';
import { drawnOnGlass } from '../../drawing/placing';
import type { ElevationFrame, Frame } from '../../drawing/frames';

/** The width at which layer pictures are laid out before they are scaled: no layout as they move. */
const LAID_OUT_PX = 1000;

interface Painted {
  readonly drawn: DrawnLayer;
  readonly transform: string;
  readonly height: number;
}

const tenth = (mm: number) => Math.round(mm * 10) / 10 + 0;

/** The view from the front: what the viewer sees through the glass, and where layers are placed and sized. */
@Component({
  selector: 'oriel-elevation',
  imports: [LayerPicture],
  templateUrl: './elevation.html',
  styleUrl: './elevation.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Elevation {
  readonly frame = input.required<ElevationFrame>();
  protected readonly store = inject(SceneStore);
  protected readonly viewer = inject(Viewer);
  private readonly alpha = inject(LayerAlpha);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  private readonly placing = viewChild<ElementRef<HTMLButtonElement>>('placing');
  protected readonly laidOutPx = LAID_OUT_PX;
  protected readonly corners = [
    { name: 'top left', x: -1, y: 1 },
    { name: 'top right', x: 1, y: 1 },
    { name: 'bottom left', x: -1, y: -1 },
    { name: 'bottom right', x: 1, y: -1 },
  ] as const;

  protected readonly glass = computed<Frame>(() => {
    const { glass } = this.store.document();
    return this.boxOf({ xMm: 0, yMm: 0, ...glass });
  });
  protected readonly painted = computed<Painted[]>(() => {
    const glass = this.glass();
    return this.store
      .ledger()
      .filter(({ layer }) => layer.shown)
      .flatMap((drawn) => {
        const seen = this.seen(drawn);
        if (!seen) return [];
        const box = this.boxOf(seen);
        const at = [box.left - glass.left, box.top - glass.top].map((px) => `${px.toFixed(3)}px`).join(',');
        const height = (LAID_OUT_PX * seen.heightMm) / seen.widthMm;
        return [{ drawn, height, transform: `translate(${at}) scale(${(box.width / LAID_OUT_PX).toFixed(6)})` }];
      });
  });
  private readonly come = signal<ReadonlySet<string>>(new Set());
  /** Whether all there is to see at first has come; layers added later appear as they come. */
  protected readonly whole = linkedSignal<boolean, boolean>({
    source: () => this.painted().every(({ drawn }) => this.come().has(drawn.layer.id)),
    computation: (all, before) => before?.value || all,
  });
  /** Sharp enough for how large layers are drawn; never given back, so nothing flickers. */
  protected readonly edge = linkedSignal<number, ReturnType<typeof edgeFor>>({
    source: () => this.glass().width,
    computation: (width, before) => {
      const wanted = edgeFor(width * 1.2 * (globalThis.devicePixelRatio ?? 1));
      return before && before.value > wanted ? before.value : wanted;
    },
  });
  protected readonly selection = computed(() => {
    const drawn = this.store.selected();
    const seen = drawn && this.seen(drawn);
    if (!drawn || !seen) return null;
    const box = this.boxOf(seen);
    const { xMm, yMm, widthMm } = drawn.layer.placed;
    return {
      id: drawn.layer.id,
      box,
      words: `Place ${drawn.layer.name}: centre ${plainMm(xMm)} mm across, ${plainMm(yMm)} mm up, ${plainMm(widthMm)} mm wide. Arrow keys move it.`,
    };
  });

  constructor() {
    effect(() => this.store.layers().forEach(({ layer }) => void this.alpha.learn(layer.image)));
  }

  protected settle(layerId: string): void {
    if (!this.whole()) this.come.update((before) => new Set(before).add(layerId));
  }

  /** Handles of a layer larger than the sheet stay within reach, at the edge of the view. */
  protected handleAt(box: Frame, corner: { x: number; y: number }): Point2 {
    const { left, top, width, height } = this.frame();
    const at = { x: box.left + (box.width * (corner.x + 1)) / 2, y: box.top + (box.height * (1 - corner.y)) / 2 };
    return { x: Math.min(Math.max(at.x, left + 4), left + width - 4), y: Math.min(Math.max(at.y, top + 4), top + height - 4) };
  }

  protected press(event: PointerEvent): void {
    if (event.button !== 0) return;
    const over = this.layersAt(event);
    if (over.length === 0) return;
    event.stopPropagation();
    const selected = over.find(({ layer }) => layer.id === this.store.selectedId());
    if (!selected) this.store.select(over[0].layer.id);
    this.movePlace(selected ?? over[0], event, () => this.store.select(over[0].layer.id));
  }

  private movePlace(drawn: DrawnLayer, press: PointerEvent, pressed: () => void): void {
    const { id, placed } = drawn.layer;
    const gesture = this.store.gesture();
    const perPx = placedPerSeen(drawn, this.viewer.eye(), this.store.document().homeEye) / this.frame().pxPerMm;
    followPointer(press, this.host, {
      move: (event) => {
        let [right, up] = [(event.clientX - press.clientX) * perPx, (press.clientY - event.clientY) * perPx];
        if (event.shiftKey) [right, up] = Math.abs(right) > Math.abs(up) ? [right, 0] : [0, up];
        gesture.edit(place(id, tenth(placed.xMm + right), tenth(placed.yMm + up)));
      },
      end: (moved) => {
        gesture.end();
        if (!moved) pressed();
        this.placing()?.nativeElement.focus({ preventScroll: true });
      },
      cancel: () => gesture.cancel(),
    });
  }

  protected scale(press: PointerEvent): void {
    const drawn = this.store.selected();
    const seen = drawn && this.seen(drawn);
    if (!drawn || !seen || press.button !== 0) return;
    press.stopPropagation();
    press.preventDefault();
    const gesture = this.store.gesture();
    const centre = drawnOnGlass(this.frame(), { x: seen.xMm, y: seen.yMm });
    const distance = (event: PointerEvent) => {
      const at = this.pointAt(event);
      return Math.hypot(at.x - centre.x, at.y - centre.y);
    };
    const start = Math.max(distance(press), 1);
    const { id, placed } = drawn.layer;
    followPointer(press, this.host, {
      move: (event) => gesture.edit(setWidth(id, tenth((placed.widthMm * distance(event)) / start))),
      end: () => gesture.end(),
      cancel: () => gesture.cancel(),
    });
  }

  /** The layers under the pointer where they are opaque, the foremost first. */
  private layersAt(event: PointerEvent): DrawnLayer[] {
    const at = this.pointAt(event);
    return [...this.store.ledger()].reverse().filter((drawn) => {
      const seen = this.seen(drawn);
      if (!seen || !drawn.layer.shown) return false;
      const box = this.boxOf(seen);
      return this.alpha.opaqueAt(drawn.layer.image, (at.x - box.left) / box.width, (at.y - box.top) / box.height);
    });
  }

  /** From home a layer is seen just where it was placed: no arithmetic stands between. */
  private seen(drawn: DrawnLayer): Rectangle | null {
    return this.viewer.atHome() ? drawn.layer.placed : seenFrom(drawn, this.viewer.eye());
  }

  private boxOf({ xMm, yMm, widthMm, heightMm }: Rectangle): Frame {
    const { pxPerMm } = this.frame();
    const { x, y } = drawnOnGlass(this.frame(), { x: xMm - widthMm / 2, y: yMm + heightMm / 2 });
    return { left: x, top: y, width: widthMm * pxPerMm, height: heightMm * pxPerMm };
  }

  private pointAt(event: PointerEvent): Point2 {
    const box = this.host.getBoundingClientRect();
    return { x: event.clientX - box.left + this.frame().left, y: event.clientY - box.top + this.frame().top };
  }
}
