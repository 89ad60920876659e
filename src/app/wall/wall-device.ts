import { Injectable, inject, signal } from '@angular/core';
import { screenPairing } from '@oriel/shared/contracts/wall-pairing';
import { wallShows } from '@oriel/shared/contracts/wall-screen';
import { Api } from '../core/api';
import { type ApiFailure, toApiFailure } from '../core/api-failure';
import { Backoff } from '../core/backoff';
import { KeptShowing, type Showing } from './kept-showing';
import { WallEvents } from './wall-events';

/**
 * Which wall this screen is, and what it shows. What was shown last is shown at once, before the server is asked, and for as long as it
 * cannot be reached. Only the server's own word that this screen is not paired takes the picture away.
 */
@Injectable()
export class WallDevice {
  private readonly api = inject(Api);
  private readonly kept = inject(KeptShowing);
  private readonly events = inject(WallEvents);
  private readonly backoff = new Backoff(2000, 60_000);
  private asking = false;
  private askAgain = false;
  /** Whether this screen may not be paired: it is asked about before anything that only a paired one may have. */
  private doubtful = false;
  private retry: ReturnType<typeof setTimeout> | undefined;

  /** What to show; null before anything is known and while the screen is not paired. */
  readonly showing = signal<Showing | null>(null);
  /** Whether the server said that this screen is not paired. */
  readonly unpaired = signal(false);
  /** Why the server did not answer, when it last did not. */
  readonly trouble = signal<ApiFailure | null>(null);

  open(): void {
    const kept = this.kept.read();
    this.unpaired.set(false);
    this.showing.set(kept);
    this.doubtful = kept === null;
    if (kept) this.listen();
    void this.refresh();
  }

  close(): void {
    this.events.stop();
    clearTimeout(this.retry);
  }

  /** Asks what to show; asked while an answer is on its way, it asks once more after it. */
  async refresh(): Promise<void> {
    if (this.asking) {
      this.askAgain = true;
      return;
    }
    this.asking = true;
    clearTimeout(this.retry);
    do {
      this.askAgain = false;
      await this.ask();
    } while (this.askAgain);
    this.asking = false;
  }

  private listen(): void {
    this.events.listen({
      changed: () => void this.refresh(),
      lost: () => {
        this.doubtful = true;
        void this.refresh();
      },
    });
  }

  private async ask(): Promise<void> {
    try {
      if (this.doubtful && !(await this.api.call(screenPairing)).paired) return await this.leave();
      this.doubtful = false;
      const showing = await this.api.call(wallShows);
      this.kept.keep(showing);
      this.backoff.succeeded();
      this.trouble.set(null);
      this.showing.set(showing);
      if (!this.events.listening) this.listen();
    } catch (error) {
      const failure = toApiFailure(error);
      if (failure.failure.code === 'not-paired') return this.leave();
      this.trouble.set(failure);
      this.retry = setTimeout(() => void this.refresh(), this.backoff.next());
    }
  }

  private async leave(): Promise<void> {
    this.close();
    this.trouble.set(null);
    this.showing.set(null);
    this.unpaired.set(true);
    await this.kept.forget();
  }
}
