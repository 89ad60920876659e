import { Directive, ElementRef, inject } from '@angular/core';
import type { Point2 } from '@oriel/shared/projection/types';
import { SheetView } from './sheet-view';

/** Zoom for each pixel a wheel turns; a notch of 100 px enlarges by about a fifth. */
const WHEEL = 0.0018;

/** Holds the paper of a sheet: a wheel or two fingers enlarge it, dragging where nothing is drawn moves it. */
@Directive({
  selector: '[orielHoldPaper]',
  host: {
    '(wheel)': 'wheel($event)',
    '(pointerdown)': 'press($event)',
    '(pointermove)': 'move($event)',
    '(pointerup)': 'release($event)',
    '(pointercancel)': 'release($event)',
  },
})
export class HoldPaper {
  private readonly view = inject(SheetView);
  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  private readonly pointers = new Map<number, Point2>();

  protected wheel(event: WheelEvent): void {
    event.preventDefault();
    const pixels = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? event.deltaY * 33 : event.deltaY;
    if (event.shiftKey) return this.view.pan(-pixels, 0);
    this.view.zoomAbout(this.within(event), Math.exp(-pixels * WHEEL * (event.ctrlKey ? 4 : 1)));
  }

  protected press(event: PointerEvent): void {
    if (event.target instanceof Element && event.target.closest('button, input, a, label')) return;
    this.pointers.set(event.pointerId, this.within(event));
    if (event.pointerType !== 'touch') this.element.setPointerCapture(event.pointerId);
  }

  protected move(event: PointerEvent): void {
    const before = this.pointers.get(event.pointerId);
    if (!before) return;
    const now = this.within(event);
    const other = [...this.pointers].find(([id]) => id !== event.pointerId)?.[1];
    this.pointers.set(event.pointerId, now);
    if (other) {
      this.view.zoomAbout(other, distance(now, other) / Math.max(distance(before, other), 1));
    } else {
      this.view.pan(now.x - before.x, now.y - before.y);
    }
  }

  protected release(event: PointerEvent): void {
    this.pointers.delete(event.pointerId);
  }

  private within({ clientX, clientY }: MouseEvent): Point2 {
    const { left, top } = this.element.getBoundingClientRect();
    return { x: clientX - left, y: clientY - top };
  }
}

const distance = (a: Point2, b: Point2) => Math.hypot(a.x - b.x, a.y - b.y);
