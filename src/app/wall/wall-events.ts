import { DOCUMENT, Injectable, inject } from '@angular/core';
import { wallEvents } from '@oriel/shared/contracts/wall-screen';
import { addressOf } from '../core/api';
import { Backoff } from '../core/backoff';

/** The service worker would only be one more thing that can break the line. */
const address = `${addressOf(wallEvents)}?ngsw-bypass=true`;
/** A line can be dead without the browser noticing, and what keeps it alive is not shown to a page. */
const askAnywayMs = 10 * 60_000;

/**
 * Hears from the server when something has changed: `changed` is called then, when the network comes back, and every ten minutes in case a
 * line is dead without anyone noticing; `lost` when a line has ended, which may be because the screen was unpaired. A lost line is taken up
 * again after a while that grows.
 */
@Injectable()
export class WallEvents {
  private readonly window = inject(DOCUMENT).defaultView!;
  private readonly backoff = new Backoff(1000, 30_000);
  private source: EventSource | null = null;
  private reopening: ReturnType<typeof setTimeout> | undefined;
  private asking: ReturnType<typeof setInterval> | undefined;
  private told: { readonly changed: () => void; readonly lost: () => void } | null = null;

  get listening(): boolean {
    return this.told !== null;
  }

  /** Listens until `stop`. */
  listen(told: { readonly changed: () => void; readonly lost: () => void }): void {
    this.stop();
    this.told = told;
    this.window.addEventListener('online', this.online);
    this.asking = setInterval(this.online, askAnywayMs);
    this.open();
  }

  stop(): void {
    this.told = null;
    this.window.removeEventListener('online', this.online);
    clearTimeout(this.reopening);
    clearInterval(this.asking);
    this.source?.close();
    this.source = null;
  }

  /** The line is taken up anew as well: the old one may be dead. */
  private readonly online = (): void => {
    this.open();
    this.told?.changed();
  };

  private open(): void {
    clearTimeout(this.reopening);
    this.source?.close();
    const source = (this.source = new EventSource(address));
    source.addEventListener('changed', () => {
      this.backoff.succeeded();
      this.told?.changed();
    });
    source.addEventListener('error', () => {
      if (this.source !== source) return;
      source.close();
      this.reopening = setTimeout(this.online, this.backoff.next());
      this.told?.lost();
    });
  }
}
