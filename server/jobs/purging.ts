import * as z from 'zod';
import { defineJob } from './job';

/** How long the bin keeps what is thrown into it, days. */
const binDays = 30;

export const binnedBefore = (now: Date): Date => new Date(now.getTime() - binDays * 24 * 3600 * 1000);

export const purgeJob = (name: string) =>
  defineJob({ name, data: z.object({}), retries: 3, expiresAfterS: 3600, atOnce: 1 });

/** The hour at which bins are emptied, UTC. */
export const purgeHour = 3;
