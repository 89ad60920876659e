import { createHash } from 'node:crypto';
import { existsSync } from 'node:fs';
import { mkdir, readFile, rename } from 'node:fs/promises';
import { inProject } from '../../../scripts/project.mjs';
import type { FacePose } from '../../video/face-path';
import { VGA, makeFaceVideo, testFace, type VideoSize } from '../../video/face-video';

/** What the fake camera shows: a face on a path of the test's own. */
export interface FilmedFace {
  readonly name: string;
  readonly poses: readonly FacePose[];
  /** 640 x 480 at 30 a second where left out. */
  readonly size?: VideoSize;
}

/** The truth of each frame in pixels, in the form of `npm run bench:tracking`. */
export interface FilmedTruth {
  readonly W: number;
  readonly H: number;
  readonly FPS: number;
  readonly frames: readonly {
    readonly i: number;
    readonly on: 0 | 1;
    readonly ipd: number;
    readonly re: readonly [number, number];
    readonly le: readonly [number, number];
    readonly roll: number;
  }[];
}

/**
 * The video of a face and its truth. Made once and kept in .oriel/videos, under a name that changes with the
 * path and with the code that draws it.
 */
export async function filmFace({ name, poses, size = VGA }: FilmedFace): Promise<{ video: string; truth: FilmedTruth }> {
  const hash = createHash('sha256').update(JSON.stringify({ poses, size }));
  for (const part of ['background.ts', 'face-video.ts', 'face.png', 'flat-face.ts', 'numbered-video.ts', 'random.ts']) {
    hash.update(await readFile(inProject('tests', 'video', part)));
  }
  const folder = inProject('.oriel', 'videos');
  const base = `${folder}/${name}-${hash.digest('hex').slice(0, 16)}`;
  if (!existsSync(`${base}.mjpeg`)) {
    await mkdir(folder, { recursive: true });
    const unfinished = `${base}.unfinished-${process.pid}`;
    await makeFaceVideo(unfinished, await testFace(), poses, size);
    await rename(`${unfinished}.json`, `${base}.json`);
    await rename(`${unfinished}.mjpeg`, `${base}.mjpeg`);
  }
  return { video: `${base}.mjpeg`, truth: JSON.parse(await readFile(`${base}.json`, 'utf8')) as FilmedTruth };
}
