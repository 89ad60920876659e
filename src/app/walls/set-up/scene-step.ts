import { ChangeDetectionStrategy, Component, type OnInit, computed, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { type Scene, listScenes } from '@oriel/shared/contracts/scenes';
import { Api } from '../../core/api';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { SceneView } from '../../scene-view/scene-view';
import { WallKeeper } from './wall-keeper';

/** The fifth step: which scene the wall shows. */
@Component({
  selector: 'oriel-wall-scene-step',
  imports: [RouterLink, FailureNotice, SceneView],
  template: `
    <fieldset>
      <legend>What the wall shows</legend>
      <oriel-failure-notice [failure]="loading.failure()" [retryable]="true" (retry)="load()" />
      @if (scenes(); as scenes) {
        @if (scenes.length === 0) {
          <p class="what">There is no scene yet. <a routerLink="/scenes">Compose one</a> first; everything else can be set up meanwhile.</p>
        }
        <div class="choices">
          @for (scene of scenes; track scene.id) {
            <label [class.chosen]="scene.id === chosen()">
              <input type="radio" name="scene" [checked]="scene.id === chosen()" [disabled]="!keeper.mayTune()" (change)="choose(scene.id)" />
              <span class="window" [class.upright]="scene.document.glass.heightMm > scene.document.glass.widthMm">
                <oriel-scene-view [document]="scene.document" [label]="scene.document.name" [edge]="320" />
              </span>
              <span>{{ scene.document.name }}</span>
            </label>
          }
          <label [class.chosen]="chosen() === null">
            <input type="radio" name="scene" [checked]="chosen() === null" [disabled]="!keeper.mayTune()" (change)="choose(null)" />
            <span class="blank" aria-hidden="true"></span>
            <span>Nothing for now</span>
          </label>
        </div>
        @if (otherShape(); as words) {
          <p class="what" role="status">{{ words }}</p>
        }
      } @else if (!loading.failure()) {
        <p class="what" role="status">Fetching the scenes…</p>
      }
    </fieldset>
  `,
  styleUrls: ['./step.scss', './scene-step.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SceneStep implements OnInit {
  private readonly api = inject(Api);
  protected readonly keeper = inject(WallKeeper);
  protected readonly loading = new Submission();
  protected readonly scenes = signal<readonly Scene[] | null>(null);
  protected readonly chosen = computed(() => this.keeper.setUp()!.sceneId);
  /** Depths and zone scale with the glass; another shape is said beforehand. */
  protected readonly otherShape = computed(() => {
    const scene = this.scenes()?.find(({ id }) => id === this.chosen());
    if (!scene) return '';
    const { glass } = this.keeper.setUp()!;
    const composed = scene.document.glass;
    const shape = (glass.widthMm / glass.heightMm) * (composed.heightMm / composed.widthMm);
    if (Math.abs(shape - 1) > 0.02) return 'This scene was composed for a glass of another shape: it will be fitted whole, with something empty beside it.';
    return `Composed for ${Math.round(composed.widthMm)} mm across; here it is scaled by ${(glass.widthMm / composed.widthMm).toFixed(2)}, depths and all.`;
  });

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
}
