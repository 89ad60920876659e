import * as z from 'zod';
import { anyone, defineRoute } from './route';

/** Whether the process runs. */
export const health = defineRoute({ method: 'GET', path: '/health', access: anyone, reply: z.object({ state: z.literal('running') }) });
/** Whether it can serve: database, storage and queue answer; 503 otherwise. */
export const readiness = defineRoute({
  method: 'GET',
  path: '/ready',
  access: anyone,
  reply: z.object({ state: z.literal('ready') }),
});
