import { randomBytes, randomUUID } from 'node:crypto';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { everyRole, type Role } from '@oriel/shared/contracts/role';
import type { Route } from '@oriel/shared/contracts/route';
import { allRoutes } from '@oriel/shared/contracts/routes';
import { wallEvents } from '@oriel/shared/contracts/wall-screen';
import { newWall } from '@oriel/shared/contracts/new-wall';
import { originalKey } from '../storage/keys';
import { pairedScreen } from '../walls/testing/paired-screen';
import { wallService } from '../walls/wall-service';
import type { Browser } from './browser';
import { createTestApp, type TestApp } from './test-app';

/*
 * Who may use which route, as a full table: every route of the contract, asked by a member in each role, by a member of another household,
 * by someone in none, by a stranger, and by the paired screen of a wall there. What to expect follows from the route's access rule alone. Each request meets a household of its
 * own, so that no answer depends on the one before.
 */
type Who = Role | 'owner elsewhere' | 'in no household' | 'stranger' | 'paired screen';
const everyone: readonly Who[] = [...everyRole, 'owner elsewhere', 'in no household', 'stranger', 'paired screen'];

interface Denial {
  readonly status: number;
  readonly code: string;
}
const signedOut: Denial = { status: 401, code: 'signed-out' };
const hidden: Denial = { status: 404, code: 'not-found' };
const notPaired: Denial = { status: 401, code: 'not-paired' };
const roleFallsShort: Denial = { status: 403, code: 'not-your-role' };

function expected({ access }: Route, who: Who): Denial | 'admitted' {
  if (access.kind === 'anyone') return 'admitted';
  if (access.kind === 'wall') return who === 'paired screen' ? 'admitted' : notPaired;
  if (who === 'stranger' || who === 'paired screen') return signedOut;
  if (access.kind === 'signed-in') return 'admitted';
  if (who === 'owner elsewhere' || who === 'in no household') return hidden;
  return access.roles.includes(who) ? 'admitted' : roleFallsShort;
}

const facts = {
  machine: 'A machine',
  tuning: newWall('A wall').tuning,
  durationMs: 0,
  sampleCount: 0,
  frameIntervalP50Ms: 17,
  frameIntervalP95Ms: 17,
};

const name = (route: Route) => `${route.method} ${route.path}`;
const method = (route: Route) => route.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';

describe('security: the role table', () => {
  let app: TestApp;
  let picture: Buffer;
  beforeAll(async () => {
    app = await createTestApp();
    picture = await sharp({ create: { width: 1, height: 1, channels: 3, background: 'white' } })
      .png()
      .toBuffer();
  });
  afterAll(() => app.close());

  it('is complete: every route of the contract is mounted once, and no other', () => {
    expect(app.mounted.map(name).sort()).toEqual(allRoutes.map(name).sort());
    expect(new Set(allRoutes.map(name)).size).toBe(allRoutes.length);
  });

  /** A household with one of everything that an address can name. */
  async function furnish({
    id: householdId,
    ownerId: accountId,
  }: {
    id: string;
    ownerId: string;
  }): Promise<Record<string, string>> {
    const sha256 = randomBytes(32).toString('hex');
    await app.parts.storage.put(originalKey(sha256), picture);
    const photo = await app.db
      .insertInto('photo')
      .values({
        household_id: householdId,
        sha256,
        name: 'a.png',
        mime: 'image/png',
        bytes: 1,
        width: 1,
        height: 1,
        has_alpha: false,
        taken_at: new Date(),
      })
      .returning('id')
      .executeTakeFirstOrThrow();
    const image = await app.db
      .insertInto('layer_image')
      .values({
        household_id: householdId,
        sha256,
        width: 1,
        height: 1,
        trim: JSON.stringify({ left: 0, top: 0, ofWidth: 1, ofHeight: 1 }),
      })
      .returning('id')
      .executeTakeFirstOrThrow();
    const document = {
      name: 'A scene',
      glass: { widthMm: 520, heightMm: 290 },
      homeEye: { x: 0, y: 0, z: 600 },
      zone: { leftMm: -300, rightMm: 300, lowestMm: -100, highestMm: 100, nearestMm: 400, farthestMm: 900 },
      layers: [],
    };
    const scene = await app.db
      .insertInto('scene')
      .values({ household_id: householdId, document: JSON.stringify(document) })
      .returning('id')
      .executeTakeFirstOrThrow();
    const wall = await wallService(app.db).create(newWall('A wall'), { householdId, accountId });
    const run = await app.db
      .insertInto('run')
      .values({ household_id: householdId, name: 'A run', facts: JSON.stringify(facts), samples: '[]' })
      .returning('id')
      .executeTakeFirstOrThrow();
    const named = {
      householdId,
      photoId: photo.id,
      imageId: image.id,
      sceneId: scene.id,
      wallId: wall.id,
      runId: run.id,
      edge: '320',
    };
    return { ...named, accountId: randomUUID(), invitationId: randomUUID(), scaleId: randomUUID() };
  }

  async function enter(who: Who, { householdId, wallId }: Record<string, string>): Promise<Browser> {
    if (who === 'stranger') return app.browser();
    if (who === 'paired screen') return pairedScreen(app, wallId);
    if (who === 'owner elsewhere') return (await app.signedIn('owner')).browser;
    if (who === 'in no household') return (await app.signedIn(null)).browser;
    return (await app.signedIn(who, householdId)).browser;
  }

  /** Lines of events stay open until somebody ends them. */
  async function endStreams(asking: Promise<unknown>): Promise<void> {
    let answered = false;
    void asking.finally(() => (answered = true));
    while (!answered) {
      app.parts.eventStreams.endAll();
      await new Promise((resolve) => setTimeout(resolve, 20));
    }
  }

  for (const route of allRoutes) {
    it(name(route), async () => {
      for (const who of everyone) {
        const names = await furnish(await app.household());
        const browser = await enter(who, names);
        await browser.ask('get', '/api/me');
        const logged = app.log().length;
        const path = route.path.replace(/:(\w+)/g, (_match, param: string) => names[param]);
        const asking = browser.ask(method(route), path, route.method === 'GET' ? undefined : {});
        if (route === wallEvents) await endStreams(asking);
        const answer = await asking;
        const admitted = app.log().slice(logged).includes('"msg":"admitted"');

        const rule = expected(route, who);
        expect(answer.status, `${who}: ${answer.text}`).not.toBe(500);
        expect(admitted, `${who} admitted`).toBe(rule === 'admitted');
        if (rule === 'admitted') continue;
        expect({ status: answer.status, code: answer.body.code }, who).toEqual(rule);
      }
    });
  }

  it('hides what does not exist and what belongs to others in the same words', async () => {
    const { browser } = await app.signedIn('owner');
    const names = await furnish(await app.household());
    const [foreign, absent, nonsense] = [names['photoId'], randomUUID(), 'x'].map((id) =>
      browser.ask('get', `/api/photos/${id}`),
    );
    const bodies = (await Promise.all([foreign, absent, nonsense])).map(({ status, body }) => ({
      status,
      ...body,
      reference: '',
    }));
    expect(bodies[0].status).toBe(404);
    expect(bodies[1]).toEqual(bodies[0]);
    expect(bodies[2]).toEqual(bodies[0]);
  });
});
