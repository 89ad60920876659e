import { Location } from '@angular/common';
import { ChangeDetectionStrategy, Component, DestroyRef, type TemplateRef, computed, effect, inject, input, linkedSignal, untracked, viewChild } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Title } from '@angular/platform-browser';
import { RouterLink } from '@angular/router';
import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import { FailureNotice } from '../../core/failure-notice';
import { Icon } from '../../core/icon/icon';
import { Submission } from '../../core/submission';
import { saveWords } from '../../saving/save-words';
import { sayMoment } from '../../core/moments';
import { Crumb } from '../../shell/crumb';
import { PageBar } from '../../shell/page-bar';
import { UncertaintyBlock } from '../means/uncertainty-block';
import { MarkedSpot } from '../measuring/marked-spot';
import { RoomSheet } from '../room/room-sheet';
import { CameraStep } from './camera-step';
import { GlassStep } from './glass-step';
import { PairStep } from './pair-step';
import { RoomStep } from './room-step';
import { SceneStep } from './scene-step';
import { type Step, steps, stepsDone } from './steps';
import { ViewerStep } from './viewer-step';
import { WallKeeper } from './wall-keeper';

const names: Readonly<Record<Step, string>> = { glass: 'Glass', camera: 'Camera', room: 'Room', viewer: 'Viewer', scene: 'Scene', pair: 'Pair' };

/** The set-up of one wall: six short steps beside a drawing that follows what is typed. */
@Component({
  selector: 'oriel-set-up-page',
  imports: [MatButton, RouterLink, Crumb, FailureNotice, Icon, UncertaintyBlock, RoomSheet, GlassStep, CameraStep, RoomStep, ViewerStep, SceneStep, PairStep],
  providers: [WallKeeper, MarkedSpot],
  templateUrl: './set-up-page.html',
  styleUrl: './set-up-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SetUpPage {
  readonly wallId = input.required<string>();
  /** Which step is shown, in the address so that it can be gone back to. */
  readonly step = input<string>();
  /** The code that a screen shows, where its QR code led here. */
  readonly code = input<string>();

  protected readonly keeper = inject(WallKeeper);
  protected readonly spot = inject(MarkedSpot);
  private readonly bar = inject(PageBar);
  private readonly location = inject(Location);
  private readonly title = inject(Title);
  private readonly place = viewChild.required<TemplateRef<unknown>>('place');
  private readonly tools = viewChild.required<TemplateRef<unknown>>('tools');

  protected readonly steps = steps;
  protected readonly names = names;
  protected readonly here = linkedSignal<Step>(() => steps.find((step) => step === this.step()) ?? 'glass');
  protected readonly done = computed(() => stepsDone(this.keeper.setUp()!, this.keeper.wall()?.pairedAt ?? null));
  protected readonly at = computed(() => steps.indexOf(this.here()));
  protected readonly acting = new Submission();
  protected readonly saveState = this.keeper.autosave.state;
  protected readonly saveText = computed(() => {
    if (!this.keeper.mayTune()) return 'View only';
    if (Object.keys(this.keeper.problems()).length > 0) return 'Not saved: a figure needs another look';
    return saveWords(this.saveState(), this.keeper.autosave.saved());
  });
  protected readonly trouble = computed(() => this.saveText().startsWith('Not saved:'));
  protected readonly conflict = computed(() => {
    const state = this.saveState();
    return state.kind === 'conflict' ? { ...state.theirs, when: sayMoment(new Date(state.theirs.savedAt)) } : null;
  });

  constructor() {
    effect(() => {
      const wallId = this.wallId();
      untracked(() => void this.keeper.open(wallId));
    });
    effect(() => {
      this.bar.place.set(this.place());
      this.bar.tools.set(this.tools());
    });
    effect(() => this.title.setTitle(`${this.keeper.setUp()?.name ?? 'Wall'} · Oriel`));
    inject(DestroyRef).onDestroy(() => this.bar.clear());
  }

  protected go(step: Step): void {
    this.here.set(step);
    this.location.replaceState(`/walls/${this.wallId()}`, `step=${step}`);
  }

  protected reopen(): void {
    void this.keeper.open(this.wallId());
  }

  protected tryAgain(): void {
    void this.keeper.autosave.flush();
  }

  protected takeTheirs(): Promise<void> {
    return this.acting.run(() => this.keeper.takeTheirs());
  }

  protected saveOver(): Promise<void> {
    return this.acting.run(() => this.keeper.autosave.saveOver());
  }

  protected rename(name: string): void {
    this.keeper.edit((before: WallSetUp) => ({ ...before, name }));
  }
}
