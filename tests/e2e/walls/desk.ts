import type { Page } from '@playwright/test';
import type { Scene } from '@oriel/shared/contracts/scenes';
import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import type { Wall, WallReport } from '@oriel/shared/contracts/walls';
import { ask, householdId } from '../asking';

/** What a tuner does at the desk, asked of the server from a page that is signed in. */
export class Desk {
  constructor(private readonly page: Page) {}

  async scenes(): Promise<Scene[]> {
    const { scenes } = await ask<{ scenes: Scene[] }>(this.page, 'GET', `/api/households/${await householdId(this.page)}/scenes`);
    return scenes;
  }

  async newWall(name: string, sceneId: string): Promise<Wall> {
    const { wall } = await ask<{ wall: Wall }>(this.page, 'POST', `/api/households/${await householdId(this.page)}/walls`, { name });
    return this.change(wall.id, { sceneId });
  }

  async wall(wallId: string): Promise<Wall> {
    return (await ask<{ wall: Wall }>(this.page, 'GET', `/api/walls/${wallId}`)).wall;
  }

  async change(wallId: string, part: Partial<WallSetUp>): Promise<Wall> {
    const { revision, setUp } = await this.wall(wallId);
    return (await ask<{ wall: Wall }>(this.page, 'PUT', `/api/walls/${wallId}`, { revision, setUp: { ...setUp, ...part } })).wall;
  }

  async pair(wallId: string, code: string): Promise<void> {
    await ask(this.page, 'POST', `/api/walls/${wallId}/pairing`, { code });
  }

  async unpair(wallId: string): Promise<void> {
    await ask(this.page, 'DELETE', `/api/walls/${wallId}/pairing`);
  }

  async reports(wallId: string): Promise<WallReport[]> {
    return (await ask<{ reports: WallReport[] }>(this.page, 'GET', `/api/walls/${wallId}/reports?hours=1`)).reports;
  }
}
