import { Injectable, type TemplateRef, signal } from '@angular/core';

/** What a page puts into the frame's head: where one is, in place of the list of places, and the page's own tools. */
@Injectable({ providedIn: 'root' })
export class PageBar {
  readonly place = signal<TemplateRef<unknown> | null>(null);
  readonly tools = signal<TemplateRef<unknown> | null>(null);

  clear(): void {
    this.place.set(null);
    this.tools.set(null);
  }
}
