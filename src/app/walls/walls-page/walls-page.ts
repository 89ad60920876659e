import { ChangeDetectionStrategy, Component, DOCUMENT, DestroyRef, Injector, type OnInit, afterNextRender, computed, inject, input, signal, viewChild } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { PairingCode } from '@oriel/shared/contracts/wall-pairing';
import { createWall } from '@oriel/shared/contracts/walls';
import { FailureNotice } from '../../core/failure-notice';
import { Session } from '../../core/session';
import { Submission } from '../../core/submission';
import { TextField } from '../../core/text-field';
import { accordingTo } from '../../core/zod-validator';
import { plainMm } from '../../figures/words';
import { degrees, diagonalOf, mmPerInch } from '../../screen/screen-measure';
import { SmallPlan } from '../room/small-plan';
import { WallList } from '../wall-list';
import { reportLines, stateOf } from '../wall-words';

const refreshMs = 10_000;

/** Every wall of the household as a small plan, with its state in words. */
@Component({
  selector: 'oriel-walls-page',
  imports: [ReactiveFormsModule, RouterLink, MatButton, FailureNotice, SmallPlan, TextField],
  providers: [WallList],
  templateUrl: './walls-page.html',
  styleUrl: './walls-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WallsPage implements OnInit {
  /** The code that a screen shows, where its QR code led here. */
  readonly code = input<string>();

  private readonly router = inject(Router);
  private readonly document = inject(DOCUMENT);
  private readonly list = inject(WallList);
  protected readonly session = inject(Session);
  protected readonly form = inject(NonNullableFormBuilder).group({ name: ['', accordingTo(createWall.body.shape.name)] });
  protected readonly loading = new Submission();
  protected readonly creating = new Submission(this.form);
  protected readonly naming = signal(false);
  private readonly nameField = viewChild(TextField);
  private readonly injector = inject(Injector);
  private readonly now = signal(new Date());

  /** The same as it is shown there, in two halves; empty where it is none. */
  protected readonly codeShown = computed(() => {
    const code = PairingCode.safeParse(this.code() ?? '');
    return code.success ? `${code.data.slice(0, 3)} ${code.data.slice(3)}` : '';
  });
  /** A wall is opened where its screen is paired while a screen waits for it. */
  protected readonly opening = computed(() => (this.codeShown() ? { step: 'pair', code: this.code() } : {}));
  protected readonly walls = computed(() =>
    this.list.walls()?.map((wall) => {
      const { glass, camera, sceneId } = wall.setUp;
      const sceneName = sceneId === null ? null : (this.list.sceneNames().get(sceneId) ?? null);
      return {
        wall,
        state: stateOf(wall, sceneName, this.now()),
        lines: reportLines(wall, this.now()),
        figures: `${plainMm(glass.widthMm, 0)} × ${plainMm(glass.heightMm, 0)} mm, ${plainMm(diagonalOf(glass) / mmPerInch)} in; camera ${plainMm(degrees(camera.hfovRad))}° across`,
      };
    }),
  );

  constructor() {
    const refreshing = setInterval(() => void this.refresh(), refreshMs);
    inject(DestroyRef).onDestroy(() => clearInterval(refreshing));
  }

  ngOnInit(): void {
    void this.load();
  }

  protected load(): Promise<void> {
    return this.loading.run(() => this.list.load().then(() => this.now.set(new Date())));
  }

  protected name(): void {
    this.naming.set(true);
    afterNextRender(() => this.nameField()?.focus(), { injector: this.injector });
  }

  protected create(): Promise<void> {
    return this.creating.run(async () => {
      const wall = await this.list.create(this.form.getRawValue().name);
      await this.router.navigate(['/walls', wall.id], { queryParams: this.opening() });
    });
  }

  private async refresh(): Promise<void> {
    if (!this.document.hidden) await this.load();
  }
}
