import { DOCUMENT, Directive, ElementRef, afterNextRender, inject } from '@angular/core';

/** The heading of a part that was just opened: it takes the focus, and the part is brought into view, at once where motion is to be reduced. */
@Directive({ selector: '[orielOpenedHeading]', host: { tabindex: '-1' } })
export class OpenedHeading {
  constructor() {
    const heading = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
    const window = inject(DOCUMENT).defaultView;
    afterNextRender(() => {
      heading.focus({ preventScroll: true });
      const still = window?.matchMedia?.('(prefers-reduced-motion: reduce)').matches ?? true;
      heading.parentElement?.scrollIntoView?.({ block: 'start', behavior: still ? 'auto' : 'smooth' });
    });
  }
}
