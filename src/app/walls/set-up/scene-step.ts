import { ChangeDetectionStrategy, Component, type OnInit, computed, inject, linkedSignal, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { type Scene, listScenes } from '@oriel/shared/contracts/scenes';
import type { ViewingZone } from '@oriel/shared/projection/types';
import { Api } from '../../core/api';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { SceneView } from '../../scene-view/scene-view';
import { isClearOnWall, sceneOnWall } from './scene-on-wall';
import { WallKeeper } from './wall-keeper';

/** The fifth step: which scene the wall shows. */
@Component({
  selector: 'oriel-wall-scene-step',
  imports: [MatButton, RouterLink, FailureNotice, SceneView],
  templateUrl: './scene-step.html',
  styleUrls: ['./step.scss', './scene-step.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SceneStep implements OnInit {
  private readonly api = inject(Api);
  protected readonly keeper = inject(WallKeeper);
  protected readonly loading = new Submission();
  private readonly scenes = signal<readonly Scene[] | null>(null);
  protected readonly chosen = computed(() => this.keeper.setUp()!.sceneId);
  protected readonly choices = computed(() => {
    const setUp = this.keeper.setUp()!;
    return this.scenes()?.map(({ id, document }) => ({ id, document, upright: document.glass.heightMm > document.glass.widthMm, clear: isClearOnWall(document, setUp) }));
  });
  /** A scene that would be clear as things are and lies as the glass does, to be shown in place of one that is not. */
  protected readonly clearOne = computed(() => {
    const { widthMm, heightMm } = this.keeper.setUp()!.glass;
    return this.choices()?.find(({ id, clear, upright }) => clear && upright === heightMm > widthMm && id !== this.chosen()) ?? null;
  });
  protected readonly onWall = computed(() => {
    const scene = this.scenes()?.find(({ id }) => id === this.chosen());
    return scene ? sceneOnWall(scene.document, this.keeper.setUp()!) : null;
  });

  /** The zone as it was before one press narrowed it for the scene; until another scene is chosen. */
  protected readonly before = linkedSignal<string | null, ViewingZone | null>({ source: this.chosen, computation: () => null });

  ngOnInit(): void {
    void this.load();
  }

  protected load(): Promise<void> {
    return this.loading.run(async () => {
      const householdId = this.keeper.wall()!.householdId;
      this.scenes.set((await this.api.call(listScenes, { params: { householdId } })).scenes);
    });
  }

  protected choose(sceneId: string | null): void {
    this.keeper.edit((before) => ({ ...before, sceneId }));
  }

  protected take(zone: ViewingZone): void {
    this.before.set(this.keeper.setUp()!.zone);
    this.keeper.zone(zone);
  }

  protected putBack(zone: ViewingZone): void {
    this.keeper.zone(zone);
    this.before.set(null);
  }
}
