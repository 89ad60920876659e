import { ChangeDetectionStrategy, Component, type ElementRef, computed, inject, input, signal, viewChild } from '@angular/core';
import type { Point2 } from '@oriel/shared/projection/types';
import { clamp, depthLimits, eyeLimits } from '../commands/limits';
import { setDepth } from '../commands/layer-commands';
import { setGlass, setHomeEye, setZone } from '../commands/setting-commands';
import { type Gesture, SceneStore } from '../scene-store';
import { Viewer } from '../walk/viewer';
import { describeEye } from '../../figures/words';
import { acrossOf, sidesOf, withAcross } from '../../drawing/across';
import { drawLines, type DrawnLine, drawSetting, glassNoteY, projectionLines, sightlines } from './depth-drawing';
import { homeWordAt } from './home-word';
import { followPointer } from '../../drawing/follow-pointer';
import { type Held, pick } from './picking';
import { drawnAt, drawnOnGlass, pointedAt } from '../../drawing/placing';
import { type DepthFrame, type ElevationFrame, asPoints } from '../../drawing/frames';
import { snapToRound, toMillimetre } from './snapping';

/** So near to the eye its own words stand, px. */
const besideEyePx = 90;
/** A letter of the eye's words is about so wide, px. */
const widePx = 5.8;

/** Plan or section: the views in which depth is seen, and dragged. */
@Component({
  selector: 'oriel-depth-view',
  templateUrl: './depth-view.html',
  styleUrl: './depth-view.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DepthView {
  readonly frame = input.required<DepthFrame>();
  /** The elevation the projection lines come from, where it stands on the same paper. */
  readonly elevation = input<ElevationFrame | null>(null);

  protected readonly store = inject(SceneStore);
  protected readonly viewer = inject(Viewer);
  private readonly svg = viewChild.required<ElementRef<SVGSVGElement>>('svg');

  protected readonly plan = computed(() => this.frame().view === 'plan');
  protected readonly title = computed(() => (this.plan() ? 'Plan' : 'Section'));
  protected readonly setting = computed(() => drawSetting(this.frame(), this.store.document()));
  protected readonly sightlines = computed(() => sightlines(this.frame(), this.store.document(), this.viewer.eye()));
  /** In the document's order, which no depth changes: a line that has the focus keeps it. */
  protected readonly lines = computed(() => drawLines(this.frame(), this.store.layers(), this.store.selectedId()));
  protected readonly projection = computed(() => {
    const selected = this.store.selected();
    const elevation = this.elevation();
    if (!selected?.layer.shown) return [];
    const corner = elevation && ((seen: { xMm: number; yMm: number; widthMm: number; heightMm: number }) => {
      const at = drawnOnGlass(elevation, { x: seen.xMm + seen.widthMm / 2, y: seen.yMm - seen.heightMm / 2 });
      return { x: Math.min(at.x, elevation.left + elevation.width), y: Math.min(at.y, elevation.top + elevation.height) };
    });
    return projectionLines(this.frame(), selected, this.viewer.eye(), corner).flat();
  });
  protected readonly eye = computed(() => {
    const eye = this.viewer.eye();
    const at = drawnAt(this.frame(), { across: acrossOf(this.frame().view, eye), z: eye.z });
    return { at, words: `${this.viewer.atHome() ? 'home eye' : 'eye'} ${describeEye(eye)}` };
  });
  /** To which side of the eye its words stand, so that they stay on the paper. */
  protected readonly eyeWordsLeft = computed(() => this.eye().at.x > this.frame().left + this.frame().width * 0.6);
  protected readonly homeWord = computed(() => {
    const { at, words } = this.eye();
    const width = words.length * widePx;
    const ring = { left: at.x - 9, top: at.y - 9, width: 18, height: 18 };
    const beside = { left: this.eyeWordsLeft() ? at.x - 13 - width : at.x + 13, top: at.y + 8, width, height: 14 };
    return homeWordAt(this.setting().home, this.plan() ? [ring, beside] : [ring]);
  });
  /** Out of the way of what is written beside the eye. */
  protected readonly zoneLabel = computed(() => {
    const { low, high } = this.setting().zoneLabel;
    const { x, y } = this.eye().at;
    return y > low.y - besideEyePx && x < low.x + besideEyePx ? high : low;
  });
  protected readonly glassNoteY = computed(() => glassNoteY(this.setting().glass.to.y, this.lines()));
  protected readonly limits = computed(() => depthLimits(this.store.document()));

  protected readonly over = signal<Held | null>(null);
  private readonly held = signal<Held | null>(null);
  protected readonly cursor = computed(() => cursorOf(this.held() ?? this.over(), this.plan(), this.held() !== null));

  /** In the plan every layer is named beside its line; in the section only the selected one, above the drawing. */
  protected labelOf(line: DrawnLine): Point2 | null {
    if (this.plan()) return line.label;
    const { top, left } = this.frame();
    if (!line.selected) return null;
    return { x: Math.max(line.to.x - line.labelWidth + 8, this.elevation() ? 0 : left + 4), y: this.elevation() ? top - 8 : top + 14 };
  }

  protected breakMark(at: Point2): string {
    const across = this.plan();
    const steps = [-6, -2, 2, 6].map((along, i) => ({ along, out: [0, -2.5, 2.5, 0][i] }));
    return asPoints(steps.map(({ along, out }) => (across ? { x: at.x + out, y: at.y + along } : { x: at.x + along, y: at.y + out })));
  }

  protected hover(event: PointerEvent): void {
    if (event.buttons === 0) this.over.set(this.pickAt(event));
  }

  protected press(event: PointerEvent): void {
    const held = this.pickAt(event);
    if (!held || event.button !== 0) return;
    event.stopPropagation();
    if (held.kind === 'layer') this.takeUp(held.id);
    if (this.store.readOnly() && held.kind !== 'eye') return;
    this.hold(held, event);
  }

  /** The layer pressed has the focus, and not the one whose wide reach happens to lie uppermost. */
  private takeUp(id: string): void {
    this.store.select(id);
    this.svg().nativeElement.querySelector<SVGElement>(`[data-layer="${id}"]`)?.focus({ preventScroll: true });
  }

  private hold(held: Held, event: PointerEvent): void {
    const gesture = this.store.gesture();
    const grip = this.gripOf(held, this.pointAt(event));
    this.held.set(held);
    followPointer(event, this.svg().nativeElement, {
      move: (moved) => {
        const at = this.pointAt(moved);
        this.drag(held, { x: at.x + grip.x, y: at.y + grip.y }, moved.altKey, gesture);
      },
      end: () => {
        this.held.set(null);
        gesture.end();
      },
      cancel: () => {
        this.held.set(null);
        gesture.cancel();
      },
    });
  }

  private drag(held: Held, at: Point2, free: boolean, gesture: Gesture): void {
    const frame = this.frame();
    const document = this.store.document();
    const { across, z } = pointedAt(frame, at);
    const whole = { across: toMillimetre(across), z: toMillimetre(z) };
    switch (held.kind) {
      case 'layer':
        return gesture.edit(setDepth(held.id, free ? toMillimetre(-z) : snapToRound(-z, frame.depth)));
      case 'eye':
        return this.viewer.standAt(withAcross(frame.view, this.viewer.eye(), whole.across, clamp(whole.z, eyeLimits(document))));
      case 'glass': {
        const size = Math.max(2 * Math.abs(whole.across), 1);
        return gesture.edit(setGlass({ ...document.glass, ...(this.plan() ? { widthMm: size } : { heightMm: size }) }));
      }
      case 'home':
        return gesture.edit(setHomeEye(withAcross(frame.view, document.homeEye, whole.across, whole.z)));
      case 'zone': {
        const { low, high } = sidesOf(frame.view);
        return gesture.edit(setZone({ [held.side]: held.side === low || held.side === high ? whole.across : Math.max(whole.z, 1) }));
      }
    }
  }

  /** How far from the thing's own place the pointer took hold of it, so that nothing jumps. */
  private gripOf(held: Held, at: Point2): Point2 {
    if (held.kind === 'zone' || held.kind === 'glass') return { x: 0, y: 0 };
    const line = this.lines().find(({ id }) => held.kind === 'layer' && id === held.id);
    const own = held.kind === 'layer' ? line?.from : held.kind === 'eye' ? this.eye().at : this.setting().home;
    return own ? { x: own.x - at.x, y: own.y - at.y } : { x: 0, y: 0 };
  }

  protected nudge(line: DrawnLine, event: KeyboardEvent): void {
    const farther = this.plan() ? ['ArrowUp', 'ArrowRight'] : ['ArrowLeft', 'ArrowUp'];
    const nearer = this.plan() ? ['ArrowDown', 'ArrowLeft'] : ['ArrowRight', 'ArrowDown'];
    const way = farther.includes(event.key) || event.key === 'PageUp' ? 1 : nearer.includes(event.key) || event.key === 'PageDown' ? -1 : 0;
    if (way === 0) return;
    event.preventDefault();
    event.stopPropagation();
    const step = (event.key.startsWith('Page') ? 10 : 1) * (event.shiftKey ? 10 : 1);
    this.store.edit(setDepth(line.id, line.depthMm + way * step), `depth ${line.id}`);
  }

  private pickAt(event: PointerEvent): Held | null {
    const { homeEye, glass, zone } = this.store.document();
    const things = { eye: this.viewer.eye(), homeEye, glass, zone, layers: this.store.layers(), selectedId: this.store.selectedId() };
    const held = pick(this.frame(), this.pointAt(event), things, event.pointerType === 'mouse' ? 9 : 22);
    return this.store.readOnly() && held && held.kind !== 'eye' && held.kind !== 'layer' ? null : held;
  }

  private pointAt(event: PointerEvent): Point2 {
    const box = this.svg().nativeElement.getBoundingClientRect();
    return { x: event.clientX - box.left + this.frame().left, y: event.clientY - box.top + this.frame().top };
  }
}

function cursorOf(held: Held | null, plan: boolean, dragging: boolean): string {
  if (!held) return '';
  if (held.kind === 'eye' || held.kind === 'home') return dragging ? 'grabbing' : 'grab';
  if (held.kind === 'glass') return plan ? 'ew-resize' : 'ns-resize';
  const alongDepth = held.kind === 'layer' || held.side === 'nearestMm' || held.side === 'farthestMm';
  return alongDepth === plan ? 'ns-resize' : 'ew-resize';
}
