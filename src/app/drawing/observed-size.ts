import { DestroyRef, type ElementRef, type Signal, afterNextRender, inject, signal } from '@angular/core';
import type { Room } from './frames';

/** The size of an element as it changes; zero until it is on the page. To be called where injection is possible. */
export function observedSize(element: () => ElementRef<Element> | undefined): Signal<Room> {
  const size = signal<Room>({ width: 0, height: 0 }, { equal: (a, b) => a.width === b.width && a.height === b.height });
  const destroyed = inject(DestroyRef);
  afterNextRender(() => {
    const observed = element()?.nativeElement;
    if (!observed || typeof ResizeObserver === 'undefined') return;
    const measure = () => size.set({ width: observed.clientWidth, height: observed.clientHeight });
    const observer = new ResizeObserver(measure);
    observer.observe(observed);
    measure();
    destroyed.onDestroy(() => observer.disconnect());
  });
  return size.asReadonly();
}
