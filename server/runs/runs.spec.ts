import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { newWall } from '@oriel/shared/contracts/new-wall';
import { runMaxSamples, type RunHeader, type RunSample } from '@oriel/shared/contracts/runs';
import { createTestApp, type SignedIn, type TestApp } from '../testing/test-app';

let app: TestApp;
let householdId: string;
let tuner: SignedIn;
beforeAll(async () => {
  app = await createTestApp();
  householdId = (await app.household()).id;
  tuner = await app.signedIn('tuner', householdId);
});
afterAll(() => app.close());

/** In full digits, as clocks give them. */
const sample = (i: number, different: Partial<RunSample> = {}): RunSample => ({
  capturedMs: 1000 + (i * 1000) / 30 + 1 / 3,
  receivedMs: 1031.123456789 + (i * 1000) / 30,
  eye: [Math.sin(i / 7) * 312.3456789, 40 + i / 333, 1503.23456789 + i / 77],
  cropMs: 1.123456789,
  detectMs: 3.987654321,
  landmarksMs: 4.55555555,
  totalMs: 9.66666666,
  ...different,
});
const recorded = (count: number) => ({
  id: randomUUID() as string,
  name: 'At rest',
  wallId: null as string | null,
  machine: 'Linux x86_64, 4 cores',
  tuning: newWall('A wall').tuning,
  frameIntervalP50Ms: 16.7,
  frameIntervalP95Ms: 17.1,
  samples: Array.from({ length: count }, (_, i) => sample(i)),
});
const keep = (body: object, who = tuner, household = householdId) =>
  who.browser.ask('post', `/api/households/${household}/runs`, body);
const list = async (): Promise<RunHeader[]> =>
  (await tuner.browser.ask('get', `/api/households/${householdId}/runs`)).body.runs;

describe('runs', () => {
  it('are kept with every digit, the frames without anybody too, and say who recorded them', async () => {
    const run = { ...recorded(31), samples: [...recorded(30).samples, sample(30, { eye: null })] };
    const answer = await keep(run);
    expect(answer.status, answer.text).toBe(200);
    const { samples, ...facts } = run;
    expect(answer.body.run).toMatchObject({ ...facts, sampleCount: 31, recordedBy: 'Test person' });
    // 30 intervals of a thirtieth of a second.
    expect(answer.body.run.durationMs).toBeCloseTo(1000, 9);
    const read = await tuner.browser.ask('get', `/api/runs/${answer.body.run.id}`);
    expect(read.body).toEqual({ run: answer.body.run, samples });
  });

  it('are listed without samples, the newest first', async () => {
    const first = (await keep({ ...recorded(2), name: 'First' })).body.run;
    const second = (await keep({ ...recorded(2), name: 'Second' })).body.run;
    const runs = await list();
    expect(runs.slice(0, 2)).toEqual([second, first]);
    expect(JSON.stringify(runs)).not.toContain('capturedMs');
  });

  it('hold ten minutes at thirty a second, in full digits', async () => {
    const run = recorded(runMaxSamples);
    expect(JSON.stringify(run).length).toBeGreaterThan(3_000_000);
    const answer = await keep(run);
    expect(answer.status, answer.text).toBe(200);
    const read = await tuner.browser.ask('get', `/api/runs/${answer.body.run.id}`);
    expect(read.body.samples).toHaveLength(runMaxSamples);
    expect(read.body.samples.at(-1)).toEqual(run.samples.at(-1));
    const longer = await keep({ ...run, samples: [...run.samples, sample(0)] });
    expect(longer.status).toBe(400);
    expect(longer.body.fields).toEqual({ samples: 'A run holds at most ten minutes' });
  });

  it('are renamed and removed', async () => {
    const { run } = (await keep(recorded(2))).body;
    const renamed = await tuner.browser.ask('patch', `/api/runs/${run.id}`, { name: ' Calmer ', was: run.name });
    expect(renamed.body.run).toEqual({ ...run, name: 'Calmer' });
    expect((await tuner.browser.ask('delete', `/api/runs/${run.id}`)).status).toBe(200);
    expect((await tuner.browser.ask('get', `/api/runs/${run.id}`)).status).toBe(404);
  });

  it('are kept once when sent again, whole, under the name they have meanwhile; nobody else’s is touched or told', async () => {
    const body = { ...recorded(2), name: 'Once' };
    const { run } = (await keep(body)).body;
    await tuner.browser.ask('patch', `/api/runs/${run.id}`, { name: 'Named', was: 'Once' });
    expect((await keep(body)).body.run).toEqual({ ...run, name: 'Named' });
    expect((await list()).filter(({ id }) => id === body.id)).toHaveLength(1);
    // Stored while it was still being recorded, and then as a whole.
    const whole = (await keep({ ...recorded(9), id: body.id })).body.run;
    expect([whole.sampleCount, (await keep(body)).body.run.sampleCount]).toEqual([9, 9]);
    const foreign = (await app.household()).id;
    const them = await app.signedIn('tuner', foreign);
    expect((await keep({ ...recorded(2), id: body.id }, them, foreign)).status).toBe(404);
  });

  it('are not renamed over another’s name, unless once more; the same name twice is no quarrel', async () => {
    const { run } = (await keep({ ...recorded(2), name: 'Seen' })).body;
    const rename = (name: string, was: string) => tuner.browser.ask('patch', `/api/runs/${run.id}`, { name, was });
    await rename('Hers', 'Seen');
    const late = await rename('His', 'Seen');
    expect([late.status, late.body.code, late.body.detail]).toEqual([409, 'renamed-meanwhile', { name: 'Hers' }]);
    expect((await rename('Hers', 'Seen')).status).toBe(200);
    expect((await rename('His', late.body.detail.name)).body.run.name).toBe('His');
  });

  it('belong to a wall of the household, and outlive it', async () => {
    const { wall } = (await tuner.browser.ask('post', `/api/households/${householdId}/walls`, { name: 'A wall' })).body;
    const { run } = (await keep({ ...recorded(2), wallId: wall.id })).body;
    expect(run.wallId).toBe(wall.id);
    await tuner.browser.ask('delete', `/api/walls/${wall.id}`);
    expect((await tuner.browser.ask('get', `/api/runs/${run.id}`)).body.run).toEqual({ ...run, wallId: null });
  });

  it('refuse what cannot be', async () => {
    for (const samples of [
      [],
      [sample(0)],
      [sample(0), { ...sample(1), eye: [1, 2] }],
      [sample(0), { ...sample(1), capturedMs: null }],
    ])
      expect((await keep({ ...recorded(2), samples })).status).toBe(400);
  });

  it("security: another household's wall is refused, and its runs are not to be found", async () => {
    const foreign = (await app.household()).id;
    const them = await app.signedIn('tuner', foreign);
    const { wall } = (await them.browser.ask('post', `/api/households/${foreign}/walls`, { name: 'Theirs' })).body;
    const before = (await list()).length;
    for (const wallId of [wall.id, randomUUID()]) {
      const answer = await keep({ ...recorded(2), wallId });
      expect([answer.status, answer.body.code]).toEqual([422, 'wall-not-here']);
    }
    expect(await list()).toHaveLength(before);
    const { run } = (await keep(recorded(2), them, foreign)).body;
    for (const method of ['get', 'patch', 'delete'] as const)
      expect(
        (await tuner.browser.ask(method, `/api/runs/${run.id}`, method === 'patch' ? { name: 'Mine', was: run.name } : undefined))
          .status,
      ).toBe(404);
  });

  it('security: only this route takes bodies so large, and only from whoever may use it', async () => {
    const big = { name: 'x'.repeat(3_000_000) };
    expect((await tuner.browser.ask('post', `/api/households/${householdId}/walls`, big)).status).toBe(413);
    expect((await keep({ ...recorded(2), machine: 'x'.repeat(9_000_000) })).status).toBe(413);
    const viewer = await app.signedIn('viewer', householdId);
    expect((await keep(recorded(runMaxSamples), viewer)).status).toBe(403);
  });
});
