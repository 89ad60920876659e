import { randomUUID } from 'node:crypto';
import * as fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Photo } from '@oriel/shared/contracts/photos';
import { createTestApp, type SignedIn, type TestApp } from '../testing/test-app';

let app: TestApp;
let householdId: string;
let viewer: SignedIn;
let designer: SignedIn;

/** Rows alone: what is asked of the list needs no files. Many share a moment, so that ties fall on the edges of pages. */
async function addPhotos(household: string, photos: readonly { name: string; takenAt: string }[]): Promise<string[]> {
  const rows = await app.db
    .insertInto('photo')
    .values(
      photos.map(({ name, takenAt }) => ({
        household_id: household,
        sha256: randomUUID(),
        name,
        mime: 'image/jpeg',
        bytes: 1000,
        width: 30,
        height: 20,
        has_alpha: false,
        taken_at: takenAt,
      })),
    )
    .returning('id')
    .execute();
  return rows.map(({ id }) => id);
}

const list = async (query: Record<string, string> = {}, household = householdId, who = viewer) => {
  const answer = await who.browser.ask(
    'get',
    `/api/households/${household}/photos?${new URLSearchParams(query).toString()}`,
  );
  expect(answer.status, answer.text).toBe(200);
  return answer.body as { photos: Photo[]; next: string | null; total: number };
};
const names = async (search: string) => (await list({ search })).photos.map(({ name }) => name).sort();

beforeAll(async () => {
  app = await createTestApp();
  householdId = (await app.household()).id;
  viewer = await app.signedIn('viewer', householdId);
  designer = await app.signedIn('designer', householdId);
  await addPhotos(householdId, [
    { name: 'Harbour.jpg', takenAt: '2023-12-31T23:59:59Z' },
    { name: 'Snow 2024.jpg', takenAt: '2019-02-01T10:00:00Z' },
    { name: 'Garden.jpg', takenAt: '2024-05-01T00:00:00Z' },
    { name: 'Picnic.jpg', takenAt: '2024-05-31T23:59:59Z' },
    { name: '100%_real\\path.jpg', takenAt: '2024-06-01T00:00:00Z' },
    { name: "O'Brien; drop table photo; --.jpg", takenAt: '2001-01-01T00:00:00Z' },
  ]);
});
afterAll(() => app.close());

describe('the list of photos', () => {
  it('gives every photo once, newest first, over ties and whatever the page length', async () => {
    const crowd = (await app.household()).id;
    const member = await app.signedIn('viewer', crowd);
    const moments = ['2020-01-01T00:00:00Z', '2020-01-01T00:00:00.001Z', '2021-06-06T06:06:06Z'];
    const ids = await addPhotos(
      crowd,
      Array.from({ length: 47 }, (_, i) => ({ name: `${i}.jpg`, takenAt: moments[i % 3] })),
    );
    await fc.assert(
      fc.asyncProperty(fc.integer({ min: 1, max: 50 }), async (limit) => {
        const seen: Photo[] = [];
        let after: string | null = null;
        do {
          const page: Awaited<ReturnType<typeof list>> = await list(
            { limit: String(limit), ...(after ? { after } : {}) },
            crowd,
            member,
          );
          expect(page.photos.length).toBeLessThanOrEqual(limit);
          expect(page.total).toBe(47);
          seen.push(...page.photos);
          after = page.next;
        } while (after);
        expect(seen.map(({ id }) => id).sort()).toEqual([...ids].sort());
        const key = ({ takenAt, id }: Photo) => `${takenAt} ${id}`;
        expect(seen.map(key)).toEqual(seen.map(key).sort().reverse());
      }),
      { numRuns: 12 },
    );
  });

  it('does not slip when photos come in while someone pages', async () => {
    const household = (await app.household()).id;
    const member = await app.signedIn('viewer', household);
    await addPhotos(
      household,
      [1, 2, 3, 4].map((day) => ({ name: `${day}`, takenAt: `2020-01-0${day}T00:00:00Z` })),
    );
    const first = await list({ limit: '2' }, household, member);
    await addPhotos(household, [{ name: 'new', takenAt: '2022-01-01T00:00:00Z' }]);
    const second = await list({ limit: '2', after: first.next! }, household, member);
    expect([...first.photos, ...second.photos].map(({ name }) => name)).toEqual(['4', '3', '2', '1']);
  });

  it.each([
    ['harb', ['Harbour.jpg']],
    ['2024', ['100%_real\\path.jpg', 'Garden.jpg', 'Picnic.jpg', 'Snow 2024.jpg']],
    ['May 2024', ['Garden.jpg', 'Picnic.jpg']],
    ['2024-05', ['Garden.jpg', 'Picnic.jpg']],
    ['2024 june', ['100%_real\\path.jpg']],
    ['dec 2023', ['Harbour.jpg']],
    ['May 2025', []],
    ['2024-13', []],
  ])('finds by name, year or month: %s', async (search, found) => {
    expect(await names(search)).toEqual([...found].sort());
  });

  it.each([
    ['%', ['100%_real\\path.jpg']],
    ['_', ['100%_real\\path.jpg']],
    ['\\', ['100%_real\\path.jpg']],
    ["o'brien; DROP", ["O'Brien; drop table photo; --.jpg"]],
    ["' or '1'='1", []],
    ["') union select password_hash from account --", []],
  ])('security: takes a search literally: %s', async (search, found) => {
    expect(await names(search)).toEqual(found);
  });

  it.each(['x', 'W10', '../..', Buffer.from('["2020-01-01T00:00:00Z","1 or 1=1"]').toString('base64url')])(
    'security: refuses a place in the list that it did not give: %s',
    async (after) => {
      const answer = await viewer.browser.ask(
        'get',
        `/api/households/${householdId}/photos?after=${encodeURIComponent(after)}`,
      );
      expect([answer.status, answer.body.code]).toEqual([400, 'bad-cursor']);
    },
  );

  it('security: refuses a NUL in a search without an unexpected failure', async () => {
    expect((await viewer.browser.ask('get', `/api/households/${householdId}/photos?search=a%00b`)).status).toBeLessThan(
      500,
    );
  });
});

describe('the bin', () => {
  it('takes photos out of the list and gives them back', async () => {
    const household = (await app.household()).id;
    const owner = await app.signedIn('owner', household);
    const [a, b] = await addPhotos(household, [
      { name: 'a', takenAt: '2020-01-02T00:00:00Z' },
      { name: 'b', takenAt: '2020-01-01T00:00:00Z' },
    ]);
    const at = (query = {}) =>
      list(query, household, owner).then(({ photos, total }) => [photos.map(({ name }) => name), total]);
    const post = (what: string, photoIds: string[]) =>
      owner.browser.ask('post', `/api/households/${household}/photos/${what}`, { photoIds });
    const binned = await post('bin', [a]);
    expect(binned.body.photos).toMatchObject([{ id: a, binnedAt: expect.any(String) }]);
    expect(await at()).toEqual([['b'], 1]);
    expect(await at({ bin: 'true' })).toEqual([['a'], 1]);
    expect((await post('bin', [a, b])).body.photos.find(({ id }: Photo) => id === a).binnedAt).toBe(
      binned.body.photos[0].binnedAt,
    );
    expect((await post('restoration', [a, b])).body.photos).toHaveLength(2);
    expect(await at()).toEqual([['a', 'b'], 2]);
  });

  it("security: does not reach another household's photos", async () => {
    const household = (await app.household()).id;
    const [theirs] = await addPhotos(household, [{ name: 'theirs', takenAt: '2020-01-02T00:00:00Z' }]);
    for (const what of ['bin', 'restoration', 'reading'])
      expect(
        (await designer.browser.ask('post', `/api/households/${householdId}/photos/${what}`, { photoIds: [theirs] }))
          .body,
      ).toEqual({ photos: [] });
    const { binned_at } = await app.db
      .selectFrom('photo')
      .select('binned_at')
      .where('id', '=', theirs)
      .executeTakeFirstOrThrow();
    expect(binned_at).toBeNull();
  });
});

describe('ten thousand photos', () => {
  it('cost the same at the last page as at the first, and little', async () => {
    const household = (await app.household()).id;
    const member = await app.signedIn('viewer', household);
    const start = Date.UTC(2000, 0);
    for (let block = 0; block < 10; block++)
      await addPhotos(
        household,
        Array.from({ length: 1000 }, (_, i) => ({
          name: `IMG_${block * 1000 + i}.jpg`,
          takenAt: new Date(start + (block * 1000 + i) * 3.6e6).toISOString(),
        })),
      );
    let after: string | null = null;
    const times: number[] = [];
    let count = 0;
    do {
      const started = performance.now();
      const page: Awaited<ReturnType<typeof list>> = await list(
        { limit: '500', ...(after ? { after } : {}) },
        household,
        member,
      );
      times.push(performance.now() - started);
      count += page.photos.length;
      after = page.next;
    } while (after);
    expect(count).toBe(10_000);
    expect(Math.max(...times)).toBeLessThan(1000);
  });
});
