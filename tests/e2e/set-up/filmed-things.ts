import { createHash } from 'node:crypto';
import { existsSync } from 'node:fs';
import { mkdir, readFile, rename } from 'node:fs/promises';
import { inProject } from '../../../scripts/project.mjs';
import { boardLight, cardLight, makeFilm, type HeldThing } from '../../video/board-film';

/** Flat things held before a camera one after another: where, how turned, and for how many frames. */
export interface FilmedThings {
  readonly name: string;
  readonly hfovRad: number;
  readonly things: readonly (Omit<HeldThing, 'light'> & { readonly kind: 'board' | 'card' })[];
}

const lights = { board: boardLight, card: cardLight };

/** The film, 640 x 480 at 30 a second. Made once and kept in .oriel/videos, under a name that changes with it and with the code that draws it. */
export async function filmThings({ name, hfovRad, things }: FilmedThings): Promise<string> {
  const hash = createHash('sha256').update(JSON.stringify({ things, hfovRad }));
  for (const part of ['tests/video/board-film.ts', 'tests/video/numbered-video.ts', 'shared/viewer/measuring/board.ts']) hash.update(await readFile(inProject(part)));
  const folder = inProject('.oriel', 'videos');
  const file = `${folder}/${name}-${hash.digest('hex').slice(0, 16)}.mjpeg`;
  if (existsSync(file)) return file;
  await mkdir(folder, { recursive: true });
  const unfinished = `${file}.unfinished-${process.pid}.mjpeg`;
  await makeFilm(unfinished, { width: 640, height: 480, fps: 30, hfovRad }, things.map(({ kind, ...held }) => ({ ...held, light: lights[kind] })));
  await rename(unfinished, file);
  return file;
}
