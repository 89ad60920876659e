import { ChangeDetectionStrategy, Component, type OnInit, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { type Scene, listScenes } from '@oriel/shared/contracts/scenes';
import { Api } from '../../core/api';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { SceneView } from '../../scene-view/scene-view';
import { sceneOnWall } from './scene-on-wall';
import { WallKeeper } from './wall-keeper';

/** The fifth step: which scene the wall shows. */
@Component({
  selector: 'oriel-wall-scene-step',
  imports: [MatButton, RouterLink, FailureNotice, SceneView],
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
        @if (onWall(); as it) {
          <section class="judged" role="status" aria-label="The scene on this wall">
            <p><span class="mark" [class.clear]="it.clear" aria-hidden="true"></span><strong>{{ it.verdict }}</strong></p>
            @if (it.layers.length > 0) {
              <ul class="figures">
                @for (layer of it.layers; track layer.name) {
                  <li>{{ layer.name }}: {{ layer.worst }}</li>
                }
              </ul>
            }
            @for (remedy of it.remedies; track remedy) {
              <p class="what">{{ remedy }}</p>
            }
            <p class="what figures">{{ it.scaled }}</p>
            @if (!it.clear) {
              <a matButton="outlined" [routerLink]="['/compose', chosen()]">Open it in the composer</a>
            }
          </section>
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
  protected readonly onWall = computed(() => {
    const scene = this.scenes()?.find(({ id }) => id === this.chosen());
    return scene ? sceneOnWall(scene.document, this.keeper.setUp()!) : null;
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
