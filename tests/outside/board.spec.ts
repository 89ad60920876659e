import { readFileSync } from 'node:fs';
import { runInNewContext } from 'node:vm';
import { beforeAll, describe, expect, it } from 'vitest';
import { BOARD, BOARD_HEIGHT_MM, BOARD_WIDTH_MM, CORNER_COUNT, blackOfBoard } from '@oriel/shared/viewer/measuring/board';
import { inProject } from '../../scripts/project.mjs';
import { normalNoise, repeatableRandom } from '../video/random';
import { startOpenCv, type Mat, type OpenCv } from './opencv';

interface Seen {
  readonly type: string;
  readonly ids: number[];
  readonly corners: number[];
}
interface Lens {
  readonly type: string;
  readonly rmsPx: number;
  readonly focalPx: number;
  readonly focalSpreadPx: number;
  readonly centre: { readonly x: number; readonly y: number };
  readonly radial: readonly number[];
}

const WIDTH = 960;
const HEIGHT = 540;
const FOCAL = 831.38; // 60 degrees across, computed: 480 / tan 30

/** The worker's own script, run on OpenCV in Node: what it is told and what it answers. */
function startWorker(cv: OpenCv): (message: unknown) => Promise<unknown> {
  let answer: (message: unknown) => void = () => undefined;
  const self: { onmessage?: (event: { data: unknown }) => Promise<void>; postMessage: (message: unknown) => void } = {
    postMessage: (message) => answer(message),
  };
  runInNewContext(readFileSync(inProject('src', 'app', 'calibration', 'board-worker.js'), 'utf8'), { cv, self, importScripts: () => undefined });
  return (message) => {
    const answered = new Promise((resolve) => (answer = resolve));
    void self.onmessage?.({ data: message });
    return answered;
  };
}

/** Reference: OpenCV.js. Rodrigues and projectPoints give where the board is seen; the pictures are drawn from our own rectangles. */
describe('measuring a camera with the board', () => {
  let cv: OpenCv;
  let ask: ReturnType<typeof startWorker>;
  beforeAll(async () => {
    ({ cv } = await startOpenCv());
    ask = startWorker(cv);
  });

  const rows = BOARD.rows * 2 * 35;
  const columns = BOARD.columns * 2 * 35;
  const black = new Uint8Array(rows * columns);
  for (const { x, y, width, height } of blackOfBoard()) {
    for (let r = Math.round(2 * y); r < Math.round(2 * (y + height)); r++) black.fill(1, r * columns + Math.round(2 * x), r * columns + Math.round(2 * (x + width)));
  }

  function turnOf(vector: readonly number[]): Float64Array {
    const from = cv.matFromArray(3, 1, cv.CV_64F, vector);
    const to = new cv.Mat();
    cv.Rodrigues(from, to);
    const turn = Float64Array.from(to.data64F);
    for (const mat of [from, to]) mat.delete();
    return turn;
  }

  /** A grey picture of the board turned about its middle and set at a place, mm before the lens; each pixel the mean of nine rays. */
  function pictureOf(turnVector: readonly number[], place: readonly number[], seed: number): Uint8Array {
    const r = turnOf(turnVector);
    const noise = normalNoise(WIDTH * HEIGHT, 2, repeatableRandom(seed));
    const grey = new Uint8Array(WIDTH * HEIGHT);
    const normal = [r[2], r[5], r[8]];
    const reach = normal[0] * place[0] + normal[1] * place[1] + normal[2] * place[2];
    for (let py = 0; py < HEIGHT; py++) {
      for (let px = 0; px < WIDTH; px++) {
        let light = 0;
        for (let s = 0; s < 9; s++) {
          const dx = (px + ((s % 3) - 1) / 3 - (WIDTH / 2 - 0.5)) / FOCAL;
          const dy = (py + (Math.floor(s / 3) - 1) / 3 - (HEIGHT / 2 - 0.5)) / FOCAL;
          const t = reach / (normal[0] * dx + normal[1] * dy + normal[2]);
          const at = [t * dx - place[0], t * dy - place[1], t - place[2]];
          const x = r[0] * at[0] + r[3] * at[1] + r[6] * at[2] + BOARD_WIDTH_MM / 2;
          const y = r[1] * at[0] + r[4] * at[1] + r[7] * at[2] + BOARD_HEIGHT_MM / 2;
          const inside = x >= 0 && y >= 0 && x < BOARD_WIDTH_MM && y < BOARD_HEIGHT_MM;
          light += inside && black[Math.floor(2 * y) * columns + Math.floor(2 * x)] ? 30 : 220;
        }
        grey[py * WIDTH + px] = Math.min(255, Math.max(0, light / 9 + noise[py * WIDTH + px]));
      }
    }
    return grey;
  }

  /** Where projectPoints sees the inner corners, counted from the picture's left upper corner as the board's finder does. */
  function cornersOf(turnVector: readonly number[], place: readonly number[]): Float64Array {
    const across = BOARD.columns - 1;
    const points = Array.from({ length: CORNER_COUNT }, (_, id) => [
      ((id % across) + 1) * BOARD.squareMm - BOARD_WIDTH_MM / 2,
      (Math.floor(id / across) + 1) * BOARD.squareMm - BOARD_HEIGHT_MM / 2,
      0,
    ]);
    const mats: Mat[] = [
      cv.matFromArray(CORNER_COUNT, 3, cv.CV_64F, points.flat()),
      cv.matFromArray(3, 1, cv.CV_64F, turnVector),
      cv.matFromArray(3, 1, cv.CV_64F, place),
      cv.matFromArray(3, 3, cv.CV_64F, [FOCAL, 0, WIDTH / 2, 0, FOCAL, HEIGHT / 2, 0, 0, 1]),
      cv.matFromArray(4, 1, cv.CV_64F, [0, 0, 0, 0]),
      new cv.Mat(),
    ];
    cv.projectPoints(mats[0], mats[1], mats[2], mats[3], mats[4], mats[5]);
    const pixels = Float64Array.from(mats[5].data64F);
    for (const mat of mats) mat.delete();
    return pixels;
  }

  const poses: [number[], number[]][] = [
    [[0.05, 0, 0], [0, 0, 420]],
    [[0.45, 0.1, 0], [-40, 20, 480]],
    [[-0.45, 0, 0.1], [60, -20, 480]],
    [[0, 0.5, 0], [50, 30, 500]],
    [[0.1, -0.5, -0.2], [-60, -30, 500]],
    [[0.35, 0.35, 0.6], [0, 0, 560]],
    [[-0.3, 0.4, 0], [90, 50, 600]],
    [[0.3, -0.35, 0], [-100, -60, 600]],
  ];

  it('finds all corners where projectPoints puts them, and the focal length within 0.5 % and three of its own standard deviations', async () => {
    const views: Seen[] = [];
    for (const [i, [turn, place]] of poses.entries()) {
      const seen = (await ask({ type: 'look', board: BOARD, width: WIDTH, height: HEIGHT, grey: pictureOf(turn, place, i + 1) })) as Seen;
      expect(seen.type).toBe('seen');
      expect(seen.ids).toHaveLength(CORNER_COUNT);
      const truth = cornersOf(turn, place);
      for (const [at, id] of seen.ids.entries()) {
        expect(Math.hypot(seen.corners[2 * at] - truth[2 * id], seen.corners[2 * at + 1] - truth[2 * id + 1])).toBeLessThan(0.5);
      }
      views.push(seen);
    }
    const lens = (await ask({ type: 'calibrate', board: BOARD, width: WIDTH, height: HEIGHT, views })) as Lens;
    expect(lens.type).toBe('lens');
    expect(lens.rmsPx).toBeLessThan(0.3);
    expect(Math.abs(lens.focalPx / FOCAL - 1)).toBeLessThan(0.005);
    expect(lens.focalSpreadPx).toBeGreaterThan(0);
    expect(Math.abs(lens.focalPx - FOCAL)).toBeLessThan(3 * lens.focalSpreadPx);
    expect(Math.hypot(lens.centre.x - WIDTH / 2, lens.centre.y - HEIGHT / 2)).toBeLessThan(4);
  });

  it('sees no board where there is none, and says when views are too few', async () => {
    const seen = (await ask({ type: 'look', board: BOARD, width: WIDTH, height: HEIGHT, grey: new Uint8Array(WIDTH * HEIGHT).fill(128) })) as Seen;
    expect(seen.ids).toEqual([]);
    expect(await ask({ type: 'calibrate', board: BOARD, width: WIDTH, height: HEIGHT, views: [] })).toMatchObject({ type: 'failed' });
  });
});
