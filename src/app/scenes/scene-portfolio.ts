import { Injectable, inject, signal } from '@angular/core';
import { type Scene, binScene, createScene, duplicateScene, listScenes, restoreScene } from '@oriel/shared/contracts/scenes';
import { Api } from '../core/api';
import { Session } from '../core/session';

/** The household's scenes, newest saved first. */
@Injectable()
export class ScenePortfolio {
  private readonly api = inject(Api);
  private readonly session = inject(Session);
  private readonly all = signal<readonly Scene[] | null>(null);
  /** Null until fetched. */
  readonly scenes = this.all.asReadonly();

  /** The scenes at hand, or those in the bin. */
  async load(bin = false): Promise<void> {
    this.all.set((await this.api.call(listScenes, { params: this.here(), query: { bin: bin ? 'true' : 'false' } })).scenes);
  }

  /** An empty sheet. */
  async create(): Promise<Scene> {
    return (await this.api.call(createScene, { params: this.here(), body: {} })).scene;
  }

  async duplicate(scene: Scene): Promise<void> {
    const { scene: copy } = await this.api.call(duplicateScene, { params: { sceneId: scene.id }, body: {} });
    this.all.update((scenes) => [copy, ...(scenes ?? [])]);
  }

  async bin(scene: Scene): Promise<void> {
    await this.api.call(binScene, { params: { sceneId: scene.id } });
    this.drop(scene);
  }

  async restore(scene: Scene): Promise<void> {
    await this.api.call(restoreScene, { params: { sceneId: scene.id } });
    this.drop(scene);
  }

  private drop(scene: Scene): void {
    this.all.update((scenes) => scenes?.filter((known) => known.id !== scene.id) ?? null);
  }

  private here() {
    return { householdId: this.session.householdId() };
  }
}
