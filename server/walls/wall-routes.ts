import { newWall } from '@oriel/shared/contracts/new-wall';
import * as scaleContract from '@oriel/shared/contracts/viewer-scales';
import * as contract from '@oriel/shared/contracts/walls';
import type { Feature } from '../http/mount';
import type { Parts } from '../parts';
import { reportsOf } from './reports';
import { viewerScales } from './viewer-scales';
import { wallService } from './wall-service';

/** What members do with walls at their desks. */
export const wallRoutes =
  ({ connection: { db } }: Parts): Feature =>
  (mount) => {
    const walls = wallService(db);
    const scales = viewerScales(db);

    mount(contract.listWalls, async ({ householdId }) => ({ walls: await walls.list(householdId) }));
    mount(contract.createWall, async ({ body, householdId, accountId }) => ({
      wall: await walls.create(newWall(body.name), { householdId, accountId }),
    }));
    mount(contract.readWall, async ({ params }) => ({ wall: await walls.read(params.wallId) }));
    mount(contract.saveWall, async ({ params, body, householdId, accountId }) => ({
      wall: await walls.save(params.wallId, body.revision, body.setUp, { householdId, accountId }),
    }));
    mount(contract.removeWall, async ({ params }) => {
      await walls.remove(params.wallId);
      return {};
    });
    mount(contract.wallReports, async ({ params, query }) => ({
      reports: await reportsOf(db, params.wallId, query.hours),
    }));

    mount(scaleContract.listViewerScales, async ({ householdId }) => ({ scales: await scales.list(householdId) }));
    mount(scaleContract.keepViewerScale, async ({ body, householdId }) => {
      await scales.keep(householdId, body);
      return { scales: await scales.list(householdId) };
    });
    mount(scaleContract.removeViewerScale, async ({ params, householdId }) => {
      await scales.remove(householdId, params.scaleId);
      return { scales: await scales.list(householdId) };
    });
  };
