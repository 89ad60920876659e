import { randomUUID } from 'node:crypto';
import type { Page } from '@playwright/test';
import { createWall, readWall, type Wall } from '@oriel/shared/contracts/walls';
import { keepRun, type RunSample } from '@oriel/shared/contracts/runs';
import { usualTuning } from '@oriel/shared/contracts/new-wall';
import { madeUpRun, standsThenWalks } from '@oriel/shared/replay/testing';
import { ask, householdId } from '../asking';

export async function makeWall(page: Page, name: string): Promise<Wall> {
  const path = createWall.path.replace(':householdId', await householdId(page));
  return createWall.reply.parse(await ask(page, 'POST', path, { name })).wall;
}

export const wallNow = async (page: Page, wallId: string): Promise<Wall> =>
  readWall.reply.parse(await ask(page, 'GET', readWall.path.replace(':wallId', wallId))).wall;

/** Keeps a run of someone made up, who stands still for six seconds and then walks. */
export async function keepMadeUpRun(page: Page, name: string, wallId: string | null, lateMs = 40, untilMs = 14_000): Promise<string> {
  const stages = { cropMs: 1, detectMs: 2, landmarksMs: 6, totalMs: 9 };
  const samples: RunSample[] = madeUpRun(standsThenWalks, { untilMs, lateMs, across: 0.5, along: 5 }).map(
    (s) => ({ ...s, ...stages }),
  );
  const body = {
    id: randomUUID(),
    name,
    wallId,
    machine: 'made up',
    tuning: usualTuning,
    frameIntervalP50Ms: 16.7,
    frameIntervalP95Ms: 17.2,
    samples,
  };
  const path = keepRun.path.replace(':householdId', await householdId(page));
  return keepRun.reply.parse(await ask(page, 'POST', path, body)).run.id;
}
