import { Injectable, inject, signal } from '@angular/core';
import { listScenes } from '@oriel/shared/contracts/scenes';
import { type Wall, createWall, listWalls } from '@oriel/shared/contracts/walls';
import { Api } from '../core/api';
import { Session } from '../core/session';

/** The household's walls, and the names of the scenes they may show. */
@Injectable()
export class WallList {
  private readonly api = inject(Api);
  private readonly session = inject(Session);
  private readonly all = signal<readonly Wall[] | null>(null);
  private readonly names = signal<ReadonlyMap<string, string>>(new Map());
  /** Null until fetched. */
  readonly walls = this.all.asReadonly();
  readonly sceneNames = this.names.asReadonly();

  async load(): Promise<void> {
    const params = { householdId: this.session.householdId() };
    const [{ walls }, { scenes }] = await Promise.all([this.api.call(listWalls, { params }), this.api.call(listScenes, { params })]);
    this.names.set(new Map(scenes.map(({ id, document }) => [id, document.name])));
    this.all.set(walls);
  }

  async create(name: string): Promise<Wall> {
    return (await this.api.call(createWall, { params: { householdId: this.session.householdId() }, body: { name } })).wall;
  }
}
