import * as z from 'zod';
import { Id, Moment } from '@oriel/shared/contracts/fields';
import { DomainFailure } from '../http/failure';

/** The last photo of a page, after which the next one starts. */
export interface Cursor {
  readonly takenAt: Date;
  readonly id: string;
}

const Written = z.tuple([Moment, Id]);

export const writeCursor = ({ takenAt, id }: Cursor): string =>
  Buffer.from(JSON.stringify([takenAt.toISOString(), id])).toString('base64url');

/** @throws bad-cursor (400) for anything that `writeCursor` did not write. */
export function readCursor(text: string): Cursor {
  try {
    const [takenAt, id] = Written.parse(JSON.parse(Buffer.from(text, 'base64url').toString('utf8')));
    return { takenAt: new Date(takenAt), id };
  } catch {
    throw new DomainFailure(
      400,
      'bad-cursor',
      'This place in the list is not known.',
      'Open the photos from the beginning.',
    );
  }
}
