import { beginningOf } from '@oriel/shared/contracts/beginning-of';

const photoNameMax = 200;
const titleMax = 120;
const unnamed = 'Untitled';

/** The last part of a file's path as some browser or system wrote it, on one line, without control characters. */
export function photoName(path: string): string {
  const name = path.split(/[\\/]/).at(-1) ?? '';
  return beginningOf(name.replace(/\p{Cc}/gu, '').trim(), photoNameMax) || unnamed;
}

/** A photo's name without its extension, as the name of what is made from it. */
export const titleFrom = (name: string): string =>
  beginningOf(name.replace(/\.[a-z0-9]{2,5}$/i, '').trim(), titleMax) || unnamed;

export const titleOfCopy = (title: string): string => `${beginningOf(title, titleMax - ' copy'.length)} copy`;
