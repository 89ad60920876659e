import { setWasmPaths } from '@tensorflow/tfjs-backend-wasm';
import { loadGraphModel, type GraphModel } from '@tensorflow/tfjs-converter';
import { env, setBackend, tensor4d, type io, type Tensor } from '@tensorflow/tfjs-core';
import { readFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import { beforeAll, expect, it } from 'vitest';
import { foldPadding } from '../../src/app/tracking/fold-padding';
import { repeatableRandom } from '../video/random';

/* Reference: the same model run by tfjs as it was published. */
const folder = fileURLToPath(new URL('../../assets/tracker/', import.meta.url));

async function load(change: (topology: object) => void): Promise<GraphModel> {
  const json = JSON.parse(await readFile(`${folder}facemesh-detection-full.json`, 'utf8')) as io.ModelJSON;
  const weightData = new Uint8Array(await readFile(`${folder}facemesh-detection-full.bin`)).buffer;
  change(json.modelTopology as object);
  const weightSpecs = json.weightsManifest.flatMap((group) => group.weights);
  return loadGraphModel({ load: () => Promise.resolve({ ...json, weightSpecs, weightData }) });
}

const paddingNodes = (topology: object): number =>
  (topology as { node: { op: string }[] }).node.filter((node) => node.op === 'Pad').length;

beforeAll(async () => {
  env().set('WASM_HAS_MULTITHREAD_SUPPORT', false);
  setWasmPaths(folder);
  await setBackend('wasm');
});

it('changes no number of the far detector, and leaves no padding node', async () => {
  const counts: number[] = [];
  const published = await load((topology) => counts.push(paddingNodes(topology)));
  const folded = await load((topology) => {
    foldPadding(topology);
    counts.push(paddingNodes(topology));
  });
  expect(counts).toEqual([45, 0]);
  const random = repeatableRandom(1);
  const pixels = tensor4d(
    Float32Array.from({ length: 192 * 192 * 3 }, () => 2 * random() - 1),
    [1, 192, 192, 3],
  );
  const outputs = [published, folded].map((model) => (model.execute(pixels, 'Identity:0') as Tensor).dataSync());
  expect(outputs[1]).toEqual(outputs[0]);
});
