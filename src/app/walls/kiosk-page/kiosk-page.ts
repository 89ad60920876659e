import { Clipboard } from '@angular/cdk/clipboard';
import { ChangeDetectionStrategy, Component, DOCUMENT, computed, effect, inject, input, signal, untracked } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { type Wall, readWall } from '@oriel/shared/contracts/walls';
import { Api } from '../../core/api';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { AddressWarning } from '../address-warning';
import { Cautions } from '../cautions/cautions';
import { kioskSteps } from './kiosk-steps';

/** How to make a small computer start straight into this wall; made to be printed. */
@Component({
  selector: 'oriel-kiosk-page',
  imports: [MatButton, RouterLink, FailureNotice, AddressWarning, Cautions],
  templateUrl: './kiosk-page.html',
  styleUrl: './kiosk-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class KioskPage {
  readonly wallId = input.required<string>();

  private readonly api = inject(Api);
  private readonly clipboard = inject(Clipboard);
  private readonly window = inject(DOCUMENT).defaultView!;
  protected readonly loading = new Submission();
  protected readonly wall = signal<Wall | null>(null);
  protected readonly origin = this.window.location.origin;
  /** Which block was copied last. */
  protected readonly copied = signal('');
  protected readonly steps = computed(() => {
    const glass = this.wall()?.setUp.glass;
    return glass ? kioskSteps({ origin: this.origin, upright: glass.heightPx > glass.widthPx }) : [];
  });

  constructor() {
    effect(() => {
      const wallId = this.wallId();
      untracked(() => void this.load(wallId));
    });
  }

  protected load(wallId = this.wallId()): Promise<void> {
    return this.loading.run(async () => this.wall.set((await this.api.call(readWall, { params: { wallId } })).wall));
  }

  protected copy(text: string): void {
    if (this.clipboard.copy(text)) this.copied.set(text);
  }

  protected print(): void {
    this.window.print();
  }
}
