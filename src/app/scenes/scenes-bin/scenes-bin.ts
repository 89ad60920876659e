import { ChangeDetectionStrategy, Component, type OnInit, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import type { Scene } from '@oriel/shared/contracts/scenes';
import { FailureNotice } from '../../core/failure-notice';
import { Session } from '../../core/session';
import { Submission } from '../../core/submission';
import { SceneView } from '../../scene-view/scene-view';
import { ScenePortfolio } from '../scene-portfolio';

/** Scenes thrown away in the last 30 days, to be put back. */
@Component({
  selector: 'oriel-scenes-bin',
  imports: [RouterLink, MatButton, FailureNotice, SceneView],
  providers: [ScenePortfolio],
  templateUrl: './scenes-bin.html',
  styleUrl: './scenes-bin.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScenesBin implements OnInit {
  protected readonly session = inject(Session);
  protected readonly portfolio = inject(ScenePortfolio);
  protected readonly work = new Submission();

  ngOnInit(): void {
    void this.load();
  }

  protected load(): Promise<void> {
    return this.work.run(() => this.portfolio.load(true));
  }

  protected putBack(scene: Scene): Promise<void> {
    return this.work.run(() => this.portfolio.restore(scene));
  }
}
