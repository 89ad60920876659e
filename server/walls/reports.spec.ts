import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Wall, WallReport } from '@oriel/shared/contracts/walls';
import type { Browser } from '../testing/browser';
import { createTestApp, type SignedIn, type TestApp } from '../testing/test-app';
import { forgetOldReports } from './reports';
import { pairedScreen } from './testing/paired-screen';

let app: TestApp;
let householdId: string;
let owner: SignedIn;
beforeAll(async () => {
  app = await createTestApp();
  householdId = (await app.household()).id;
  owner = await app.signedIn('owner', householdId);
});
afterAll(() => app.close());

const now = Date.now();
/** A report of so many seconds ago. */
const report = (agoS: number, different: Partial<WallReport> = {}): WallReport => ({
  at: new Date(now - agoS * 1000).toISOString(),
  framesPerS: 59.9,
  trackedPerS: 29.5,
  ladderStep: 0,
  ladderWords: 'landmarks, guard every frame',
  renderer: 'css',
  tracking: 'following',
  latencyMs: 31.25,
  temperatureC: 48.5,
  lastError: null,
  ...different,
});
const hang = async (): Promise<{ wall: Wall; screen: Browser }> => {
  const { wall } = (await owner.browser.ask('post', `/api/households/${householdId}/walls`, { name: 'A wall' })).body;
  return { wall, screen: await pairedScreen(app, wall.id) };
};
const send = (screen: Browser, reports: WallReport[]) => screen.ask('post', '/api/wall/reports', { reports });
const read = async (wall: Wall): Promise<Wall> => (await owner.browser.ask('get', `/api/walls/${wall.id}`)).body.wall;
const told = async (wall: Wall, hours = 1): Promise<WallReport[]> =>
  (await owner.browser.ask('get', `/api/walls/${wall.id}/reports?hours=${hours}`)).body.reports;

describe('reports of a wall', () => {
  it('are kept in batches, the newest with the wall, and say that it was heard of', async () => {
    const { wall, screen } = await hang();
    await app.db
      .updateTable('wall')
      .set({ heard_at: new Date(0) })
      .where('id', '=', wall.id)
      .execute();
    const batch = [report(30), report(10, { lastError: 'The camera was unplugged.' }), report(20)];
    expect((await send(screen, batch)).status).toBe(200);
    const { report: newest, heardAt } = await read(wall);
    expect(newest).toEqual(batch[1]);
    expect(Date.now() - Date.parse(heardAt!)).toBeLessThan(10_000);
    expect(await told(wall)).toEqual([batch[0], batch[2], batch[1]]);
  });

  it('sent again count once', async () => {
    const { wall, screen } = await hang();
    const batch = [report(60), report(30)];
    await send(screen, batch);
    await send(screen, [...batch, report(10)]);
    expect((await told(wall)).map(({ at }) => at)).toEqual([...batch, report(10)].map(({ at }) => at));
    await send(screen, [report(5), report(5)]);
    expect(await told(wall)).toHaveLength(4);
  });

  it('are thinned for long times, but for every change of the ladder and of the last error', async () => {
    const { wall, screen } = await hang();
    // One every 10 s for two hours; over 24 hours one slice is 120 s, so that about 60 are left.
    const changes = new Map([
      [300, 1],
      [301, 0],
      [302, 2],
    ]);
    const all = Array.from({ length: 720 }, (_, i) =>
      report((720 - i) * 10, { ladderStep: changes.get(i) ?? 0, lastError: i >= 500 && i < 504 ? 'lost' : null }),
    );
    for (let i = 0; i < all.length; i += 180) expect((await send(screen, all.slice(i, i + 180))).status).toBe(200);
    const thinned = await told(wall, 24);
    expect(thinned.length).toBeGreaterThanOrEqual(60);
    expect(thinned.length).toBeLessThanOrEqual(70);
    const steps = thinned.map(({ ladderStep }) => ladderStep).filter((step, i, those) => step !== those[i - 1]);
    expect(steps).toEqual([0, 1, 0, 2, 0]);
    const errors = thinned.map(({ lastError }) => lastError).filter((error, i, those) => error !== those[i - 1]);
    expect(errors).toEqual([null, 'lost', null]);
    expect(thinned.at(-1)).toEqual(all.at(-1));
    // Over 2 hours one slice is 10 s: nothing of a report every 10 s is left out.
    expect((await told(wall, 2)).length).toBeGreaterThanOrEqual(718);
  });

  it('are forgotten a week after they came', async () => {
    const { wall, screen } = await hang();
    await send(screen, [report(60), report(30)]);
    const week = 7 * 24 * 3_600_000;
    await forgetOldReports(app.db, new Date(Date.now() + week - 60_000));
    expect(await told(wall)).toHaveLength(2);
    await forgetOldReports(app.db, new Date(Date.now() + week + 60_000));
    expect(await told(wall)).toHaveLength(0);
    expect((await read(wall)).report).not.toBeNull();
  });

  it('are refused when they cannot be, and nothing of the batch is kept', async () => {
    const { wall, screen } = await hang();
    for (const reports of [
      [],
      [report(1), { ...report(2), framesPerS: -1 }],
      [{ ...report(1), at: 'yesterday' }],
      Array.from({ length: 201 }, (_, i) => report(i)),
    ])
      expect((await send(screen, reports)).status).toBe(400);
    expect(await told(wall)).toEqual([]);
  });

  it("security: are the wall's own: another screen's do not show up here", async () => {
    const [mine, other] = [await hang(), await hang()];
    await send(other.screen, [report(3)]);
    expect(await told(mine.wall)).toEqual([]);
    expect((await read(mine.wall)).report).toBeNull();
  });
});
