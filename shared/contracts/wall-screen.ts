import * as z from 'zod';
import { Id } from './fields';
import { DerivativeEdge } from './photos';
import { defineRoute, theWall } from './route';
import { Scene } from './scenes';
import { WallSetUp } from './wall-set-up';
import { WallReport } from './walls';

/** What the screen itself may use, by its own credential and for nothing but its own wall: otherwise 401 `not-paired`. `scene` is null when none is chosen or it is in the bin. */
export const wallShows = defineRoute({
  method: 'GET',
  path: '/api/wall',
  access: theWall,
  reply: z.object({ wallId: Id, setUp: WallSetUp, revision: z.number().int(), scene: Scene.nullable() }),
});
/**
 * Server-sent events: `changed` at the opening and whenever the wall's set-up or scene may have changed, and a comment every 20 s to keep
 * the line alive. Ends when the screen is unpaired.
 */
export const wallEvents = defineRoute({ method: 'GET', path: '/api/wall/events', access: theWall, answers: 'file' });
/** As `layerImageFile`, of the scene that the wall shows. */
export const wallImageFile = defineRoute({
  method: 'GET',
  path: '/api/wall/images/:imageId/:edge',
  access: theWall,
  params: z.object({ imageId: Id, edge: DerivativeEdge }),
  answers: 'file',
});
/** A report sent again, because its answer was lost, counts once. */
export const reportFromWall = defineRoute({
  method: 'POST',
  path: '/api/wall/reports',
  access: theWall,
  body: z.object({ reports: z.array(WallReport).min(1).max(200) }),
});
