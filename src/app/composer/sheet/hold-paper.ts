import { Directive, ElementRef, inject } from '@angular/core';
import type { Point2 } from '@oriel/shared/projection/types';
import { SheetView } from './sheet-view';

/** Zoom for each pixel a wheel turns; a notch of 100 px enlarges by about a fifth. */
const WHEEL = 0.0018;
/** A pinch on a touchpad comes as a wheel with Ctrl, in smaller steps. */
const TOUCHPAD_PINCH = 4;
const DOUBLE_PRESS = 1.6;

/** Holds the paper of a sheet: a wheel, two fingers or a double press enlarge it, dragging where nothing is drawn moves it. */
@Directive({
  selector: '[orielHoldPaper]',
  host: {
    '(wheel)': 'wheel($event)',
    '(dblclick)': 'zoomHere($event)',
    '(pointerdown)': 'press($event)',
    '(pointermove)': 'move($event)',
    '(pointerup)': 'release($event)',
    '(pointercancel)': 'release($event)',
  },
})
export class HoldPaper {
  private readonly view = inject(SheetView);
  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  /** Where each finger is; a second one turns whatever the first began into a pinch. */
  private readonly fingers = new Map<number, Point2>();
  private panning: { readonly id: number; readonly at: Point2 } | null = null;

  protected wheel(event: WheelEvent): void {
    event.preventDefault();
    const pixels = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? event.deltaY * 33 : event.deltaY;
    if (event.shiftKey) return this.view.pan(-pixels, 0);
    this.view.zoomAbout(this.within(event), Math.exp(-pixels * WHEEL * (event.ctrlKey ? TOUCHPAD_PINCH : 1)));
  }

  constructor() {
    // Before whatever the finger lies on takes the press for itself.
    this.element.addEventListener('pointerdown', (event) => this.touch(event), { capture: true });
  }

  /** A way to any place of the sheet that needs no dragging. */
  protected zoomHere(event: MouseEvent): void {
    if (isControl(event.target)) return;
    this.view.zoomAbout(this.within(event), event.shiftKey ? 1 / DOUBLE_PRESS : DOUBLE_PRESS);
  }

  private touch(event: PointerEvent): void {
    if (event.pointerType !== 'touch') return;
    const [first] = this.fingers.keys();
    this.fingers.set(event.pointerId, this.within(event));
    if (this.fingers.size !== 2) return;
    event.stopPropagation();
    this.panning = null;
    window.dispatchEvent(new PointerEvent('pointercancel', { pointerId: first }));
  }

  protected press(event: PointerEvent): void {
    if (isControl(event.target)) return;
    this.panning = { id: event.pointerId, at: this.within(event) };
    if (event.pointerType !== 'touch') this.element.setPointerCapture(event.pointerId);
  }

  protected move(event: PointerEvent): void {
    const now = this.within(event);
    if (this.fingers.size === 2) return this.pinch(event.pointerId, now);
    if (this.fingers.has(event.pointerId)) this.fingers.set(event.pointerId, now);
    if (this.panning?.id !== event.pointerId) return;
    this.view.pan(now.x - this.panning.at.x, now.y - this.panning.at.y);
    this.panning = { id: event.pointerId, at: now };
  }

  protected release(event: PointerEvent): void {
    this.fingers.delete(event.pointerId);
    if (this.panning?.id === event.pointerId) this.panning = null;
  }

  /** The paper follows both fingers: enlarged by how they part, moved by half of what either moves. */
  private pinch(id: number, now: Point2): void {
    const before = this.fingers.get(id);
    const other = [...this.fingers].find(([finger]) => finger !== id)?.[1];
    if (!before || !other) return;
    this.fingers.set(id, now);
    this.view.pan((now.x - before.x) / 2, (now.y - before.y) / 2);
    const middle = { x: (now.x + other.x) / 2, y: (now.y + other.y) / 2 };
    this.view.zoomAbout(middle, distance(now, other) / Math.max(distance(before, other), 1));
  }

  private within({ clientX, clientY }: MouseEvent): Point2 {
    const { left, top } = this.element.getBoundingClientRect();
    return { x: clientX - left, y: clientY - top };
  }
}

const isControl = (target: EventTarget | null) => target instanceof Element && target.closest('button, input, a, label') !== null;
const distance = (a: Point2, b: Point2) => Math.hypot(a.x - b.x, a.y - b.y);
