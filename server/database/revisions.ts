import { DomainFailure } from '../http/failure';

/** What is kept of the last save of a thing. */
export interface LastSave {
  readonly revision: number;
  readonly saved_at: Date;
  readonly saved_by: string | null;
  /** The name of whoever saved; null when they have no account any more. */
  readonly saver: string | null;
}

export const saverOf = ({ saver }: Pick<LastSave, 'saver'>): string => saver ?? 'a former member';

const remedies = {
  scene: 'Nothing was overwritten. Take the newer one, or keep yours as a copy.',
  wall: 'Nothing was overwritten. Take the newer settings, and make your change again.',
};

/**
 * Whether a save still has to be written: only the newest revision may be saved over. False when this very save was written before, its
 * answer was lost, and it was sent again. @throws revision-moved (409)
 */
export function mustWrite(
  thing: keyof typeof remedies,
  last: LastSave,
  asked: { readonly revision: number; readonly accountId: string; readonly isSame: boolean },
): boolean {
  if (last.revision === asked.revision) return true;
  if (last.revision === asked.revision + 1 && last.saved_by === asked.accountId && asked.isSame) return false;
  const savedBy = saverOf(last);
  const detail = { revision: last.revision, savedBy, savedById: last.saved_by, savedAt: last.saved_at.toISOString() };
  throw new DomainFailure(
    409,
    'revision-moved',
    `${savedBy} saved this ${thing} after you opened it.`,
    remedies[thing],
    { detail },
  );
}
