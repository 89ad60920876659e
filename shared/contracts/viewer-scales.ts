import * as z from 'zod';
import { Id, Moment, Name } from './fields';
import { everyRole, tuners } from './role';
import { defineRoute, members } from './route';
import { ViewerFactor, ViewerIpd } from './wall-set-up';

const HouseholdParams = z.object({ householdId: Id });

/** A household member's own scale, set once at a marked distance. */
export const ViewerScale = z.object({
  id: Id,
  name: Name,
  ipdMm: ViewerIpd,
  scaleFactor: ViewerFactor,
  measuredAt: Moment,
});
export type ViewerScale = z.infer<typeof ViewerScale>;
const ScalesReply = z.object({ scales: z.array(ViewerScale) });
export const listViewerScales = defineRoute({
  method: 'GET',
  path: '/api/households/:householdId/viewer-scales',
  access: members('household', everyRole),
  params: HouseholdParams,
  reply: ScalesReply,
});
/** Replaces what was kept under that name. */
export const keepViewerScale = defineRoute({
  method: 'POST',
  path: '/api/households/:householdId/viewer-scales',
  access: members('household', tuners),
  params: HouseholdParams,
  body: ViewerScale.omit({ id: true, measuredAt: true }),
  reply: ScalesReply,
});
export const removeViewerScale = defineRoute({
  method: 'DELETE',
  path: '/api/households/:householdId/viewer-scales/:scaleId',
  access: members('household', tuners),
  params: z.object({ householdId: Id, scaleId: Id }),
  reply: ScalesReply,
});
