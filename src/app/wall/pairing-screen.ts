import { ChangeDetectionStrategy, Component, DOCUMENT, DestroyRef, computed, effect, inject, input, output, signal, untracked } from '@angular/core';
import { pairingMinutes } from '@oriel/shared/contracts/wall-pairing';
import type { ApiFailure } from '../core/api-failure';
import { isOwnAddress } from '../walls/own-address';
import { Pairing } from './pairing';
import { QrCode } from './qr-code';

const tickMs = 1000;
const minuteMs = 60_000;

/** Why nothing was heard of the server, as far as a page can tell. */
const noAnswer = (online: boolean, origin: string) =>
  online ? `The server at ${origin} does not answer: see whether it runs.` : 'This screen has no network: check its cable or wireless.';

/** A screen without a wall: what to do, a code to type, and the same as a QR code. Read from across the room. */
@Component({
  selector: 'oriel-pairing-screen',
  imports: [QrCode],
  providers: [Pairing],
  templateUrl: './pairing-screen.html',
  styleUrl: './pairing-screen.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PairingScreen {
  /** Whether the server said that this screen is not paired: a code is asked for then, and not before. */
  readonly unpaired = input.required<boolean>();
  /** Why the server has not said anything, where it could not be asked. */
  readonly unanswered = input<ApiFailure | null>(null);
  readonly paired = output();

  private readonly pairing = inject(Pairing);
  private readonly document = inject(DOCUMENT);
  private readonly origin = this.document.location.origin;
  private readonly nowMs = signal(performance.now());

  protected readonly trouble = computed(() => this.pairing.trouble() ?? this.unanswered());
  protected readonly troubleWords = computed(() => {
    const trouble = this.trouble();
    const why = trouble?.offline ? noAnswer(this.document.defaultView?.navigator.onLine ?? true, this.origin) : (trouble?.failure.message ?? '');
    return `${why} It is tried again by itself.`;
  });
  protected readonly place = `${this.origin}/walls`;
  protected readonly ownAddress = isOwnAddress(this.origin);
  protected readonly code = computed(() => this.pairing.code()?.code ?? null);
  /** In two halves, as people read it to one another. */
  protected readonly halves = computed(() => this.code()?.match(/.{3}/g) ?? []);
  protected readonly link = computed(() => `${this.place}?code=${this.code()}`);
  protected readonly left = computed(() => {
    const minutes = Math.min(pairingMinutes, Math.ceil(((this.pairing.code()?.untilMs ?? 0) - this.nowMs()) / minuteMs));
    return minutes <= 1 ? 'Good for one more minute' : `Good for ${minutes} minutes`;
  });

  constructor() {
    const tick = setInterval(() => this.nowMs.set(performance.now()), tickMs);
    effect(() => {
      if (this.unpaired()) untracked(() => this.pairing.start(() => this.paired.emit()));
    });
    inject(DestroyRef).onDestroy(() => {
      clearInterval(tick);
      this.pairing.stop();
    });
  }
}
