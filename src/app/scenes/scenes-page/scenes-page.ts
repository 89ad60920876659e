import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, type OnInit, inject } from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router, RouterLink } from '@angular/router';
import type { Scene } from '@oriel/shared/contracts/scenes';
import { FailureNotice } from '../../core/failure-notice';
import { Icon } from '../../core/icon/icon';
import { Session } from '../../core/session';
import { Submission } from '../../core/submission';
import { SceneView } from '../../scene-view/scene-view';
import { ScenePortfolio } from '../scene-portfolio';

/** The portfolio: every scene of the household, each moving a little as the pointer passes over it. */
@Component({
  selector: 'oriel-scenes-page',
  imports: [DatePipe, RouterLink, MatButton, MatIconButton, MatMenu, MatMenuItem, MatMenuTrigger, Icon, FailureNotice, SceneView],
  providers: [ScenePortfolio],
  templateUrl: './scenes-page.html',
  styleUrl: './scenes-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScenesPage implements OnInit {
  private readonly router = inject(Router);
  private readonly snackBar = inject(MatSnackBar);
  protected readonly session = inject(Session);
  protected readonly portfolio = inject(ScenePortfolio);
  protected readonly loading = new Submission();
  protected readonly acting = new Submission();

  ngOnInit(): void {
    void this.load();
  }

  protected load(): Promise<void> {
    return this.loading.run(() => this.portfolio.load());
  }

  protected create(): Promise<void> {
    return this.acting.run(async () => {
      const scene = await this.portfolio.create();
      await this.router.navigate(['/compose', scene.id]);
    });
  }

  protected duplicate(scene: Scene): Promise<void> {
    return this.acting.run(() => this.portfolio.duplicate(scene));
  }

  protected bin(scene: Scene): Promise<void> {
    return this.acting.run(async () => {
      await this.portfolio.bin(scene);
      this.snackBar
        .open(`“${scene.document.name}” moved to the bin`, 'Put back', { duration: 10_000 })
        .onAction()
        .subscribe(() => void this.putBack(scene));
    });
  }

  private putBack(scene: Scene): Promise<void> {
    return this.acting.run(async () => {
      await this.portfolio.restore(scene);
      await this.portfolio.load();
    });
  }
}
