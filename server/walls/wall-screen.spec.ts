import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Scene } from '@oriel/shared/contracts/scenes';
import { wallEvents } from '@oriel/shared/contracts/wall-screen';
import type { Wall } from '@oriel/shared/contracts/walls';
import { stopGracefully } from '../http/graceful-stop';
import { listenTo, type Listener } from '../events/testing/listener';
import { quadrants } from '../pictures/testing/quadrants';
import { upload } from '../pictures/testing/upload';
import type { Browser } from '../testing/browser';
import { createTestApp, type SignedIn, type TestApp } from '../testing/test-app';
import { pairedScreen } from './testing/paired-screen';

let app: TestApp;
let second: TestApp;
let householdId: string;
let owner: SignedIn;
let elsewhere: { householdId: string; owner: SignedIn };
beforeAll(async () => {
  app = await createTestApp();
  second = await createTestApp({ beside: app });
  householdId = (await app.household()).id;
  owner = await app.signedIn('owner', householdId);
  const foreign = (await app.household()).id;
  elsewhere = { householdId: foreign, owner: await app.signedIn('owner', foreign) };
});
afterAll(async () => {
  await second.close();
  await app.close();
});

let made = 0;
const photoScene = async (who = owner, household = householdId): Promise<Scene> => {
  const png = await quadrants(100 + ++made, 60)
    .png()
    .toBuffer();
  const { photo } = (await upload(who.browser, `/api/households/${household}/photos`, png, `photo ${made}.png`)).body;
  return (await who.browser.ask('post', `/api/households/${household}/scenes`, { photoIds: [photo.id] })).body.scene;
};
const hang = async (sceneId: string | null, who = owner, household = householdId): Promise<Wall> => {
  const { wall } = (await who.browser.ask('post', `/api/households/${household}/walls`, { name: 'A wall' })).body;
  return show(wall, sceneId, who);
};
const show = async (wall: Wall, sceneId: string | null, who = owner): Promise<Wall> => {
  const now = (await who.browser.ask('get', `/api/walls/${wall.id}`)).body.wall as Wall;
  const answer = await who.browser.ask('put', `/api/walls/${wall.id}`, {
    revision: now.revision,
    setUp: { ...now.setUp, sceneId },
  });
  expect(answer.status, answer.text).toBe(200);
  return answer.body.wall;
};
const imageOf = (scene: Scene) => scene.document.layers[0].image.id;

describe('whether a screen is paired', () => {
  it('is answered to anyone, and is no longer so once it is unpaired', async () => {
    expect((await app.browser().ask('get', '/api/wall/pairing')).body).toEqual({ paired: false });
    expect((await owner.browser.ask('get', '/api/wall/pairing')).body).toEqual({ paired: false });
    const wall = await hang(null);
    const screen = await pairedScreen(app, wall.id);
    expect((await screen.ask('get', '/api/wall/pairing')).body).toEqual({ paired: true });
    await owner.browser.ask('delete', `/api/walls/${wall.id}/pairing`);
    const answer = await screen.ask('get', '/api/wall/pairing');
    expect([answer.status, answer.body]).toEqual([200, { paired: false }]);
  });
});

describe('what a screen is shown', () => {
  it('is its wall’s set-up and scene, with the pictures of its layers', async () => {
    const scene = await photoScene();
    const wall = await hang(scene.id);
    const screen = await pairedScreen(app, wall.id);
    const shown = await screen.ask('get', '/api/wall');
    expect(shown.body).toEqual({ wallId: wall.id, setUp: wall.setUp, revision: 2, scene });
    const picture = await screen.ask('get', `/api/wall/images/${imageOf(scene)}/320`);
    expect(picture.status).toBe(200);
    expect((await sharp(picture.body as Buffer).metadata()).format).toBe('webp');
  });

  it('is no scene while that lies in the bin', async () => {
    const scene = await photoScene();
    const screen = await pairedScreen(app, (await hang(scene.id)).id);
    await owner.browser.ask('delete', `/api/scenes/${scene.id}`);
    expect((await screen.ask('get', '/api/wall')).body.scene).toBeNull();
    await owner.browser.ask('post', `/api/scenes/${scene.id}/restoration`);
    expect((await screen.ask('get', '/api/wall')).body.scene.id).toBe(scene.id);
  });

  it('security: is no picture but those of its scene, not even of its household', async () => {
    const [shown, other, foreign] = [
      await photoScene(),
      await photoScene(),
      await photoScene(elsewhere.owner, elsewhere.householdId),
    ];
    const wall = await hang(shown.id);
    const screen = await pairedScreen(app, wall.id);
    for (const scene of [other, foreign])
      expect((await screen.ask('get', `/api/wall/images/${imageOf(scene)}/320`)).status).toBe(404);
    await show(wall, other.id);
    expect((await screen.ask('get', `/api/wall/images/${imageOf(shown)}/320`)).status).toBe(404);
    expect((await screen.ask('get', `/api/wall/images/${imageOf(other)}/320`)).status).toBe(200);
  });
});

describe('what a screen is told', () => {
  const open: Listener[] = [];
  const listen = async (screen: Browser, on = app): Promise<Listener> => {
    const line = await listenTo(on.express, wallEvents.path, `oriel-wall=${screen.cookie('oriel-wall')!}`);
    open.push(line);
    expect(line.status).toBe(200);
    await heard(line, 1);
    return line;
  };
  /** Within a second. */
  const heard = (line: Listener, times: number) =>
    expect.poll(line.events, { timeout: 1000, interval: 10 }).toEqual(Array<string>(times).fill('changed'));
  afterAll(() => Promise.all(open.map((line) => line.leave())));

  it('comes within a second to every server: a new set-up, another scene, and each change of that scene', async () => {
    const scene = await photoScene();
    const wall = await hang(null);
    const screen = await pairedScreen(app, wall.id);
    const lines = [await listen(screen), await listen(screen, second)];
    const all = (times: number) => Promise.all(lines.map((line) => heard(line, times)));

    await show(wall, scene.id);
    await all(2);
    const saved = await owner.browser.ask('put', `/api/scenes/${scene.id}`, {
      revision: 1,
      document: { ...scene.document, name: 'Anew' },
    });
    expect(saved.status).toBe(200);
    await all(3);
    await owner.browser.ask('delete', `/api/scenes/${scene.id}`);
    await all(4);
    await owner.browser.ask('post', `/api/scenes/${scene.id}/restoration`);
    await all(5);
    // Saved on the other server, too.
    const onSecond = await second.signIn(owner.email);
    await onSecond.ask('put', `/api/scenes/${scene.id}`, {
      revision: 2,
      document: { ...scene.document, name: 'Once more' },
    });
    await all(6);
    expect((await screen.ask('get', '/api/wall')).body.scene.document.name).toBe('Once more');
  });

  it('is of its own wall and scene only, and nothing of a save refused', async () => {
    const [scene, other] = [await photoScene(), await photoScene()];
    const [wall, next] = [await hang(scene.id), await hang(other.id)];
    const line = await listen(await pairedScreen(app, wall.id), second);
    const control = await listen(await pairedScreen(app, next.id), second);
    await owner.browser.ask('put', `/api/scenes/${other.id}`, {
      revision: 1,
      document: { ...other.document, name: 'Other' },
    });
    expect(
      (await owner.browser.ask('put', `/api/scenes/${scene.id}`, { revision: 7, document: scene.document })).status,
    ).toBe(409);
    await heard(control, 2);
    expect(line.events()).toEqual(['changed']);
  });

  it('security: ends on every server when the screen is unpaired, replaced, or its wall removed', async () => {
    const wall = await hang(null);
    const first = await pairedScreen(app, wall.id);
    const lines = [await listen(first), await listen(first, second)];
    const ended = (those: Listener[]) =>
      expect.poll(() => those.map((line) => line.hasEnded()), { timeout: 1000 }).toEqual(those.map(() => true));

    const next = await pairedScreen(app, wall.id);
    await ended(lines);
    const line = await listen(next, second);
    await owner.browser.ask('delete', `/api/walls/${wall.id}/pairing`);
    await ended([line]);
    const last = await listen(await pairedScreen(app, wall.id), second);
    await owner.browser.ask('delete', `/api/walls/${wall.id}`);
    await ended([last]);
    for (const screen of [first, next]) expect((await screen.ask('get', wallEvents.path)).status).toBe(401);
  });

  it('does not hold up a server that is asked to stop', async () => {
    let draining = false;
    const third = await createTestApp({ beside: app, draining: () => draining });
    const screen = await pairedScreen(app, (await hang(null)).id);
    const line = await listen(screen, third);
    const began = performance.now();
    draining = true;
    third.parts.eventStreams.endAll();
    const code = await new Promise<number>(
      (resolve) => void stopGracefully({ server: line.server, log: third.parts.log, steps: [], exit: resolve }),
    );
    expect(code).toBe(0);
    expect(performance.now() - began).toBeLessThan(2000);
    await expect.poll(line.hasEnded, { timeout: 1000 }).toBe(true);
    await third.close();
  });
});
