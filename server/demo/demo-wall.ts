import { newWall } from '@oriel/shared/contracts/new-wall';
import type { Database } from '../database/database';
import { scenesOf } from '../scenes/scene-queries';
import { wallService } from '../walls/wall-service';
import type { DemoAccount } from './demo-files';

const wallName = 'Landing wall';
const sceneName = 'October on the ridge';

/** Hangs a wall that shows a scene in the demo household; none where its tuner is gone. */
export async function hangDemoWall(
  db: Database,
  householdName: string,
  accounts: readonly DemoAccount[],
): Promise<void> {
  const email = accounts.find(({ role }) => role === 'tuner')?.email ?? '';
  const tuner = await db
    .selectFrom('membership')
    .innerJoin('household', 'household.id', 'membership.household_id')
    .innerJoin('account', 'account.id', 'membership.account_id')
    .select(['household.id as householdId', 'membership.account_id as accountId'])
    .where('household.name', '=', householdName)
    .where('account.email', '=', email)
    .executeTakeFirst();
  if (!tuner) return;
  const walls = wallService(db);
  const there = (await walls.list(tuner.householdId)).some(({ setUp }) => setUp.name === wallName);
  if (there) return;
  const scene = (await scenesOf(db, tuner.householdId, false)).find(({ document }) => document.name === sceneName);
  await walls.create({ ...newWall(wallName), sceneId: scene?.id ?? null }, tuner);
}
