import type { Photo } from '@oriel/shared/contracts/photos';
import type { Database } from '../database/database';
import type { ActingMember } from '../http/acting-member';
import { notFound } from '../http/failure';
import type { Jobs } from '../jobs/jobs';
import { inspectPicture } from '../pictures/inspect-picture';
import type { ReceivedFile } from '../pictures/receive-file';
import { lockContent, removeUnreferenced } from '../storage/content';
import { originalKey } from '../storage/keys';
import type { Storage } from '../storage/storage';
import { derivativeJob } from './derivative-job';
import { findPhotoByContent, readPhoto, toPhoto, type PhotoRow } from './photo-queries';

export interface Received {
  readonly photo: Photo;
  /** Whether the household had the same content before. */
  readonly duplicate: boolean;
}

interface Keeping {
  readonly db: Database;
  readonly storage: Storage;
  readonly jobs: Jobs;
}

/**
 * Takes an uploaded file in. The same content, already in this household, is the same photo, whatever the file is called.
 * @throws the refusals of `inspectPicture`; nothing is left behind then.
 */
export async function receivePhoto(keeping: Keeping, file: ReceivedFile, member: ActingMember): Promise<Received> {
  const { db, storage, jobs } = keeping;
  const known = await findPhotoByContent(db, member.householdId, file.sha256);
  if (known) return { photo: toPhoto(await welcomeBack(keeping, known)), duplicate: true };
  try {
    const id = await keep(keeping, file, member);
    jobs.nudge(derivativeJob);
    if (id) return { photo: toPhoto(await readPhoto(db, member.householdId, id)), duplicate: false };
  } catch (error) {
    await removeUnreferenced(db, storage, file.sha256);
    throw error;
  }
  const twin = await findPhotoByContent(db, member.householdId, file.sha256);
  if (!twin) throw notFound();
  return { photo: toPhoto(await welcomeBack(keeping, twin)), duplicate: true };
}

/** Brings a photo back whose content is uploaded again: out of the bin, and to another try if its derivatives failed. */
async function welcomeBack({ db, jobs }: Keeping, existing: PhotoRow): Promise<PhotoRow> {
  const again = existing.state === 'failed';
  await db.transaction().execute(async (transaction) => {
    await transaction
      .updateTable('photo')
      .set({ binned_at: null, ...(again ? { state: 'waiting', problem: null } : {}) })
      .where('id', '=', existing.id)
      .execute();
    if (again) await jobs.send(derivativeJob, { photoId: existing.id }, transaction);
  });
  return readPhoto(db, existing.household_id, existing.id);
}

/** Keeps the original and its row together, or neither. Null when the same content came in by another upload meanwhile. */
async function keep({ db, storage, jobs }: Keeping, file: ReceivedFile, { householdId, accountId }: ActingMember): Promise<string | null> {
  const facts = await inspectPicture(file.path);
  return db.transaction().execute(async (transaction) => {
    await lockContent(transaction, file.sha256);
    const row = await transaction
      .insertInto('photo')
      .values({
        household_id: householdId,
        sha256: file.sha256,
        name: file.name,
        mime: facts.mime,
        bytes: file.bytes,
        width: facts.width,
        height: facts.height,
        has_alpha: facts.hasAlpha,
        taken_at: facts.takenAt ?? file.modifiedAt ?? new Date(),
        uploaded_by: accountId,
      })
      .onConflict((conflict) => conflict.constraint('photo_once').doNothing())
      .returning('id')
      .executeTakeFirst();
    if (!row) return null;
    await jobs.send(derivativeJob, { photoId: row.id }, transaction);
    if (!(await storage.exists(originalKey(file.sha256)))) await storage.putFile(originalKey(file.sha256), file.path);
    return row.id;
  });
}
