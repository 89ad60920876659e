import { newWall } from '@oriel/shared/contracts/new-wall';
import { retarget } from '@oriel/shared/projection/retarget';
import type { ViewingZone } from '@oriel/shared/projection/types';
import type { Database } from '../database/database';
import { scenesOf } from '../scenes/scene-queries';
import { wallService } from '../walls/wall-service';
import type { DemoAccount } from './demo-files';

const wallName = 'Landing wall';
const sceneName = 'October on the ridge';

/** A zone in whole mm, nowhere larger. */
const wholeMm = (zone: ViewingZone): ViewingZone => ({
  leftMm: Math.ceil(zone.leftMm),
  rightMm: Math.floor(zone.rightMm),
  lowestMm: Math.ceil(zone.lowestMm),
  highestMm: Math.floor(zone.highestMm),
  nearestMm: Math.ceil(zone.nearestMm),
  farthestMm: Math.floor(zone.farthestMm),
});

/** Hangs a wall that shows a scene, for eyes wherever it is clear, in the demo household; none where its tuner is gone. */
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
  const wall = newWall(wallName);
  await walls.create(scene ? { ...wall, sceneId: scene.id, zone: wholeMm(retarget(scene.document, wall.glass).zone) } : wall, tuner);
}
