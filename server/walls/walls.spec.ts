import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { newWall } from '@oriel/shared/contracts/new-wall';
import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import { Wall } from '@oriel/shared/contracts/walls';
import { purgeScenes } from '../scenes/purge-scenes';
import { createTestApp, type SignedIn, type TestApp } from '../testing/test-app';

let app: TestApp;
let householdId: string;
let tuner: SignedIn;
let owner: SignedIn;
beforeAll(async () => {
  app = await createTestApp();
  householdId = (await app.household()).id;
  tuner = await app.signedIn('tuner', householdId);
  owner = await app.signedIn('owner', householdId);
});
afterAll(() => app.close());

const create = async (name: string): Promise<Wall> => {
  const answer = await tuner.browser.ask('post', `/api/households/${householdId}/walls`, { name });
  expect(answer.status, answer.text).toBe(200);
  return Wall.parse(answer.body.wall);
};
const save = (wall: Wall, setUp: WallSetUp, who = tuner, revision = wall.revision) =>
  who.browser.ask('put', `/api/walls/${wall.id}`, { revision, setUp });
const read = async (wall: Wall): Promise<Wall> => (await tuner.browser.ask('get', `/api/walls/${wall.id}`)).body.wall;
const scene = async (who = owner, household = householdId): Promise<string> =>
  (await who.browser.ask('post', `/api/households/${household}/scenes`, { name: 'A scene' })).body.scene.id;

describe('walls', () => {
  it('begin with a usual set-up, unpaired and unheard of', async () => {
    const wall = await create(' Hall ');
    expect(wall).toMatchObject({
      householdId,
      revision: 1,
      savedBy: 'Test person',
      pairedAt: null,
      heardAt: null,
      report: null,
    });
    expect(wall.setUp).toEqual(newWall('Hall'));
    expect(await read(wall)).toEqual(wall);
  });

  it('are listed by name, as people count', async () => {
    const household = (await app.household()).id;
    const them = await app.signedIn('tuner', household);
    for (const name of ['Wall 10', 'Wall 9', 'attic'])
      await them.browser.ask('post', `/api/households/${household}/walls`, { name });
    const { walls } = (await them.browser.ask('get', `/api/households/${household}/walls`)).body;
    expect(walls.map(({ setUp }: Wall) => setUp.name)).toEqual(['attic', 'Wall 9', 'Wall 10']);
  });

  it('keep every figure that is saved, and say who saved it', async () => {
    const wall = await create('Stairs');
    const setUp: WallSetUp = {
      ...wall.setUp,
      name: 'Stairs, turned',
      glass: { widthMm: 527.04, heightMm: 296.46, widthPx: 1080, heightPx: 1920, uncertainty: 0.002 },
      camera: {
        ...wall.setUp.camera,
        pitchRad: -0.1234,
        mirrored: true,
        uncertainty: { hfovRad: 0.01, pitchRad: null, positionMm: 3 },
      },
      tuning: {
        ...wall.setUp.tuning,
        displayDelayMs: 43.5,
        choice: { rule: 'longest', handOverMs: 900, handOverShare: 0.3 },
      },
      sceneId: await scene(),
    };
    const saved = await save(wall, setUp, owner);
    expect(saved.status, saved.text).toBe(200);
    expect(saved.body.wall).toMatchObject({ revision: 2, setUp });
    expect(await read(wall)).toEqual(saved.body.wall);
  });

  it('never overwrite what another saved meanwhile; one of many at once wins; a save sent again counts once', async () => {
    const wall = await create('Race');
    const answers = await Promise.all(
      Array.from({ length: 6 }, (_, i) => save(wall, { ...wall.setUp, name: `Race ${i}` }, i % 2 ? owner : tuner)),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409, 409, 409, 409, 409]);
    const now = await read(wall);
    expect(now.revision).toBe(2);
    const refused = answers.find(({ status }) => status === 409)!;
    expect(refused.body).toMatchObject({
      code: 'revision-moved',
      message: 'Test person saved this wall after you opened it.',
      detail: { revision: 2, savedAt: now.savedAt },
    });

    const setUp = { ...now.setUp, name: 'Lost' };
    const first = await save(now, setUp);
    expect((await save(now, setUp)).body).toEqual(first.body);
    expect((await save(now, setUp, owner)).status).toBe(409);
  });

  it('refuse what cannot be, field by field', async () => {
    const wall = await create('Wrong');
    const glass = { ...wall.setUp.glass, widthMm: 0 };
    const zone = { ...wall.setUp.zone, nearestMm: 4000 };
    const answer = await save(wall, { ...wall.setUp, glass, zone });
    expect(answer.status).toBe(400);
    expect(Object.keys(answer.body.fields).sort()).toEqual(['setUp.glass.widthMm', 'setUp.zone.farthestMm']);
    expect((await read(wall)).revision).toBe(1);
  });

  it('show a scene that is there; one in the bin may stay but not be chosen; one purged is gone', async () => {
    const wall = await create('Shows');
    const [first, second] = [await scene(), await scene()];
    const showing = Wall.parse((await save(wall, { ...wall.setUp, sceneId: first })).body.wall);
    for (const id of [first, second]) await owner.browser.ask('delete', `/api/scenes/${id}`);
    const renamed = await save(showing, { ...showing.setUp, name: 'Shows still' });
    expect(renamed.status).toBe(200);
    const chosen = await save(Wall.parse(renamed.body.wall), { ...showing.setUp, sceneId: second });
    expect(chosen.status).toBe(422);
    expect(chosen.body).toMatchObject({ code: 'scene-not-here', fields: { 'setUp.sceneId': expect.any(String) } });

    await app.db
      .updateTable('scene')
      .set({ binned_at: new Date(2000, 0) })
      .where('id', '=', first)
      .execute();
    await purgeScenes(app.db, app.parts.storage);
    expect((await read(wall)).setUp).toMatchObject({ name: 'Shows still', sceneId: null });
  });

  it('are gone when removed', async () => {
    const wall = await create('Gone');
    expect((await tuner.browser.ask('delete', `/api/walls/${wall.id}`)).status).toBe(200);
    expect((await tuner.browser.ask('get', `/api/walls/${wall.id}`)).status).toBe(404);
  });

  it("security: another household's scene cannot be hung on a wall, nor one that does not exist", async () => {
    const foreign = (await app.household()).id;
    const wall = await create('Ours');
    for (const sceneId of [await scene(await app.signedIn('designer', foreign), foreign), randomUUID()]) {
      const answer = await save(wall, { ...wall.setUp, sceneId });
      expect(answer.status).toBe(422);
      expect(answer.body.code).toBe('scene-not-here');
    }
    expect((await read(wall)).setUp.sceneId).toBeNull();
  });

  it("security: another household's tuner finds no wall of ours, by any route", async () => {
    const wall = await create('Hidden');
    const stranger = await app.signedIn('tuner');
    const at = `/api/walls/${wall.id}`;
    for (const answer of [
      await stranger.browser.ask('get', at),
      await stranger.browser.ask('put', at, { revision: 1, setUp: wall.setUp }),
      await stranger.browser.ask('delete', at),
      await stranger.browser.ask('get', `${at}/reports`),
      await stranger.browser.ask('post', `${at}/pairing`, { code: 'ABC234' }),
      await stranger.browser.ask('delete', `${at}/pairing`),
      await stranger.browser.ask('get', `/api/households/${householdId}/walls`),
    ])
      expect([answer.status, answer.body.code]).toEqual([404, 'not-found']);
    expect((await read(wall)).revision).toBe(1);
  });

  it.each([
    `'; drop table wall; --`,
    `{{7*7}} \${7*7}`,
    `<script>alert(1)</script>`,
    `100% _under_ \\ back\\slash`,
    `__proto__`,
  ])('security: hostile text is an ordinary name of a wall, a scale or a run: %s', async (name) => {
    const wall = await create(name);
    expect(wall.setUp.name).toBe(name);
    expect((await save(wall, { ...wall.setUp, name: `${name}!` })).body.wall.setUp.name).toBe(`${name}!`);
    const scales = await tuner.browser.ask('post', `/api/households/${householdId}/viewer-scales`, {
      name,
      ipdMm: { value: 63, uncertainty: 1 },
      scaleFactor: 1,
    });
    expect(scales.body.scales.map((scale: { name: string }) => scale.name)).toContain(name);
    expect((await tuner.browser.ask('get', `/api/walls/${encodeURIComponent(name)}`)).status).toBe(404);
    expect((await tuner.browser.ask('post', `/api/walls/${wall.id}/pairing`, { code: name })).status).toBe(400);
  });
});

describe("viewers' scales", () => {
  it('are kept by name, replaced under the same name, and removed', async () => {
    const household = (await app.household()).id;
    const them = await app.signedIn('tuner', household);
    const at = `/api/households/${household}/viewer-scales`;
    await them.browser.ask('post', at, { name: 'Maud', ipdMm: { value: 61.5, uncertainty: 0.8 }, scaleFactor: 1.05 });
    await them.browser.ask('post', at, { name: 'Jory', ipdMm: { value: 55, uncertainty: 1 }, scaleFactor: 1.04 });
    const again = await them.browser.ask('post', at, {
      name: ' Maud ',
      ipdMm: { value: 62, uncertainty: 0.5 },
      scaleFactor: 1.06,
    });
    expect(again.body.scales).toMatchObject([
      { name: 'Jory', ipdMm: { value: 55, uncertainty: 1 }, scaleFactor: 1.04 },
      { name: 'Maud', ipdMm: { value: 62, uncertainty: 0.5 }, scaleFactor: 1.06 },
    ]);
    const [jory] = again.body.scales;
    const left = await them.browser.ask('delete', `${at}/${jory.id}`);
    expect(left.body.scales.map(({ name }: { name: string }) => name)).toEqual(['Maud']);
  });

  it("security: another household's scale is not removed", async () => {
    const kept = await tuner.browser.ask('post', `/api/households/${householdId}/viewer-scales`, {
      name: 'Ours',
      ipdMm: { value: 63, uncertainty: 1 },
      scaleFactor: 1,
    });
    const { id } = kept.body.scales.find(({ name }: { name: string }) => name === 'Ours');
    const foreign = (await app.household()).id;
    const them = await app.signedIn('owner', foreign);
    expect((await them.browser.ask('delete', `/api/households/${foreign}/viewer-scales/${id}`)).status).toBe(200);
    const { scales } = (await tuner.browser.ask('get', `/api/households/${householdId}/viewer-scales`)).body;
    expect(scales.map((scale: { id: string }) => scale.id)).toContain(id);
  });
});
