import { Injectable, inject, signal } from '@angular/core';
import { askPairing, claimPairing, pairingMinutes } from '@oriel/shared/contracts/wall-pairing';
import { Api } from '../core/api';
import { type ApiFailure, toApiFailure } from '../core/api-failure';
import { Backoff } from '../core/backoff';

const claimMs = 2000;
const lifeMs = pairingMinutes * 60_000;

interface Asked {
  readonly code: string;
  readonly claim: string;
  /** On this page's clock: a small computer that starts without a network may have any date. */
  readonly untilMs: number;
}

/** Asks for a code, waits until somebody has entered it, and asks for another whenever one has run out. */
@Injectable()
export class Pairing {
  private readonly api = inject(Api);
  private readonly backoff = new Backoff(2000, 30_000);
  private timer: ReturnType<typeof setTimeout> | undefined;
  private over = false;
  private readonly asked = signal<Asked | null>(null);

  /** The code to show, null until there is one. */
  readonly code = this.asked.asReadonly();
  /** Why the server did not answer, when it last did not. */
  readonly trouble = signal<ApiFailure | null>(null);

  /** Goes on until `stop`, or until this screen is paired; the credential is then in its cookie. */
  start(paired: () => void): void {
    void this.step(paired);
  }

  stop(): void {
    this.over = true;
    clearTimeout(this.timer);
  }

  private async step(paired: () => void): Promise<void> {
    let waitMs = claimMs;
    try {
      if (await this.isPaired()) return paired();
      this.trouble.set(null);
      this.backoff.succeeded();
    } catch (error) {
      this.trouble.set(toApiFailure(error));
      waitMs = this.backoff.next();
    }
    if (!this.over) this.timer = setTimeout(() => void this.step(paired), waitMs);
  }

  private async isPaired(): Promise<boolean> {
    const asked = this.asked();
    if (!asked || asked.untilMs < performance.now()) {
      this.asked.set(null);
      const { code, claim } = await this.api.call(askPairing);
      this.asked.set({ code, claim, untilMs: performance.now() + lifeMs });
      return false;
    }
    const { state } = await this.api.call(claimPairing, { body: { claim: asked.claim } });
    if (state === 'expired') this.asked.set(null);
    return state === 'paired' && !this.over;
  }
}
