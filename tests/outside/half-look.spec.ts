import { readFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import { expect, it } from 'vitest';
import { loadFaceModels } from '../../src/app/tracking/tfjs-face-models';
import { repeatableRandom } from '../video/random';

/* Reference: the same model in one piece. */
const folder = fileURLToPath(new URL('../../assets/tracker/', import.meta.url));
const read = async (name: string): Promise<ArrayBuffer> => new Uint8Array(await readFile(folder + name)).buffer;

it('gives the same numbers in two halves as in one piece, whatever is looked at between, and keeps no tensor', async () => {
  const models = await loadFaceModels({ folder, read });
  const random = repeatableRandom(1);
  const pixels = (n: number): Float32Array => Float32Array.from({ length: n * n * 3 }, () => 2 * random() - 1);
  const [seen, other] = [pixels(192), pixels(192)];
  const whole = models.detectFull(seen);
  const before = models.tensors();
  models.beginFull(other);
  models.beginFull(seen);
  models.landmarks(other);
  models.detectShort(pixels(128));
  const halves = models.finishFull();
  expect(halves).toHaveLength(2304 * 17);
  expect(halves).toEqual(whole);
  expect(models.tensors()).toBe(before);
  expect(() => models.finishFull()).toThrow('begun');
  models.dispose();
});
