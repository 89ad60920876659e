import * as contract from '@oriel/shared/contracts/runs';
import type { Feature } from '../http/mount';
import type { Parts } from '../parts';
import { runService } from './run-service';

export const runRoutes =
  ({ connection: { db } }: Parts): Feature =>
  (mount) => {
    const runs = runService(db);

    mount(contract.listRuns, async ({ householdId }) => ({ runs: await runs.list(householdId) }));
    mount(contract.keepRun, async ({ body, householdId, accountId }) => ({
      run: await runs.keep(body, { householdId, accountId }),
    }));
    mount(contract.readRun, ({ params }) => runs.read(params.runId));
    mount(contract.renameRun, async ({ params, body }) => ({ run: await runs.rename(params.runId, body.name, body.was) }));
    mount(contract.removeRun, async ({ params }) => {
      await runs.remove(params.runId);
      return {};
    });
  };
