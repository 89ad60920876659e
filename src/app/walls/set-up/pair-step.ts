import { ChangeDetectionStrategy, Component, DOCUMENT, DestroyRef, type OnInit, computed, inject, input, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { pairWall, pairingMinutes } from '@oriel/shared/contracts/wall-pairing';
import { FailureNotice } from '../../core/failure-notice';
import { sayMoment } from '../../core/moments';
import { Submission } from '../../core/submission';
import { TextField } from '../../core/text-field';
import { accordingTo } from '../../core/zod-validator';
import { AddressWarning } from '../address-warning';
import { Cautions } from '../cautions/cautions';
import { WallKeeper } from './wall-keeper';

/** While a code is on its way the server is asked this often whether the screen has come. */
const askMs = 2000;

/** The last step: the screen gets a credential of its own, or loses it. */
@Component({
  selector: 'oriel-wall-pair-step',
  imports: [ReactiveFormsModule, RouterLink, MatButton, FailureNotice, TextField, AddressWarning, Cautions],
  templateUrl: './pair-step.html',
  styleUrl: './step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PairStep implements OnInit {
  /** What is to be entered already, where a screen's QR code led here. */
  readonly code = input('');

  private readonly router = inject(Router);
  protected readonly keeper = inject(WallKeeper);
  protected readonly origin = inject(DOCUMENT).location.origin;
  protected readonly address = `${this.origin}/wall`;
  protected readonly minutes = pairingMinutes;
  protected readonly form = inject(NonNullableFormBuilder).group({ code: ['', accordingTo(pairWall.body.shape.code)] });
  protected readonly pairing = new Submission(this.form);
  protected readonly acting = new Submission();
  /** What is asked once more before it is done. */
  protected readonly sure = signal<'unpair' | 'remove' | null>(null);
  protected readonly again = signal(false);
  /** The code was taken; the screen fetches its credential within seconds. */
  protected readonly waiting = signal(false);
  /** When it was paired before that. */
  private before: string | null = null;
  protected readonly pairedWhen = computed(() => {
    const at = this.keeper.wall()?.pairedAt;
    return at ? sayMoment(new Date(at)) : '';
  });
  protected readonly heardWhen = computed(() => {
    const at = this.keeper.wall()?.heardAt;
    return at ? sayMoment(new Date(at)) : '';
  });

  constructor() {
    const asking = setInterval(() => void this.ask(), askMs);
    inject(DestroyRef).onDestroy(() => clearInterval(asking));
  }

  ngOnInit(): void {
    this.form.controls.code.setValue(this.code());
    this.again.set(this.code() !== '');
  }

  protected pair(): Promise<void> {
    const before = this.keeper.wall()?.pairedAt ?? null;
    return this.pairing.run(async () => {
      await this.keeper.pair(this.form.getRawValue().code);
      this.form.reset();
      this.before = before;
      this.waiting.set(this.keeper.wall()?.pairedAt === before);
      this.again.set(false);
    });
  }

  protected unpair(): Promise<void> {
    return this.acting.run(async () => {
      await this.keeper.unpair();
      this.sure.set(null);
    });
  }

  protected remove(): Promise<void> {
    return this.acting.run(async () => {
      await this.keeper.remove();
      await this.router.navigateByUrl('/walls');
    });
  }

  private async ask(): Promise<void> {
    if (!this.waiting()) return;
    await this.keeper.look();
    if (this.keeper.wall()?.pairedAt !== this.before) this.waiting.set(false);
  }
}
