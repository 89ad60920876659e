import { ChangeDetectionStrategy, Component, DOCUMENT, computed, inject, input, linkedSignal, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router } from '@angular/router';
import { Icon } from '../core/icon/icon';
import { CameraStep } from './camera-step';
import { CheckStep } from './check-step';
import { GlassStep } from './glass-step';
import { nominalPxMm } from './screen-measure';
import { setUpOf } from './screen-set-up';
import { ThisScreen } from './this-screen';

const steps = ['The glass', 'The camera', 'A look'] as const;

/** The set-up of this screen in three short steps; nothing is kept until the end, and every step may be skipped. */
@Component({
  selector: 'oriel-screen-page',
  imports: [MatButton, Icon, GlassStep, CameraStep, CheckStep],
  templateUrl: './screen-page.html',
  styleUrl: './screen-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScreenPage {
  /** Where to go afterwards, a path of this site; the scenes where none is given. */
  readonly back = input<string>();

  private readonly window = inject(DOCUMENT).defaultView!;
  private readonly router = inject(Router);
  private readonly thisScreen = inject(ThisScreen);
  protected readonly steps = steps;
  protected readonly step = signal(0);
  protected readonly decided = this.thisScreen.decided;
  protected readonly draft = linkedSignal(() => this.thisScreen.setUp());
  protected readonly pxMm = computed(() => this.draft().devicePxMm * this.window.devicePixelRatio);
  private readonly wayBack = computed(() => {
    const back = this.back() ?? '';
    return /^\/[^/\\]/.test(back) ? back : '/scenes';
  });

  protected measure(pxMm: number): void {
    this.draft.update(({ camera }) => setUpOf(this.window, pxMm, pxMm !== nominalPxMm, camera));
  }

  protected async keep(): Promise<void> {
    this.thisScreen.keep(this.draft());
    await this.leave();
  }

  /** Goes on with the usual measures, which counts as decided. */
  protected async skip(): Promise<void> {
    if (!this.decided()) this.thisScreen.keep(this.thisScreen.setUp());
    await this.leave();
  }

  private async leave(): Promise<void> {
    await this.router.navigateByUrl(this.wayBack());
  }
}
