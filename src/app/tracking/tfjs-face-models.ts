import { setWasmPaths } from '@tensorflow/tfjs-backend-wasm';
import { loadGraphModel, type GraphModel } from '@tensorflow/tfjs-converter';
import { dispose, env, memory, ready, setBackend, tensor4d, type io, type Tensor } from '@tensorflow/tfjs-core';
import { FULL_RANGE, SHORT_RANGE } from './detector-anchors';
import { foldPadding } from './fold-padding';
import { LANDMARK_INPUT } from './face-landmarks';
import type { FaceModels } from './face-models';

/** Where the tracker's files come from: the page's own server in the browser, the disk in tests. */
export interface TrackerFiles {
  read(name: string): Promise<ArrayBuffer>;
  /** Address or path of the folder with the wasm files, ending in a slash. */
  readonly folder: string;
}

/** The one layer of the far detector all else passes through, at half of its time: 9.8 of 20.9 ms, measured with tfjs wasm. */
export const FULL_HALFWAY = 'StatefulPartitionedCall/model/activation_10/Relu';

/**
 * Loads the three networks onto tfjs' WebAssembly backend. SIMD is used where the machine has it; threads never, because their helpers
 * are blob workers that the content security policy refuses.
 * @throws Error where a file is missing or WebAssembly is not available.
 */
export async function loadFaceModels(files: TrackerFiles): Promise<FaceModels> {
  env().set('WASM_HAS_MULTITHREAD_SUPPORT', false);
  setWasmPaths(files.folder);
  if (!(await setBackend('wasm'))) throw new Error('WebAssembly could not be started in this browser.');
  await ready();
  const [short, full, mesh] = await Promise.all([
    loadModel(files, 'facemesh-detection-short'),
    loadModel(files, 'facemesh-detection-full', foldPadding),
    loadModel(files, 'facemesh'),
  ]);
  let begun: Tensor | null = null;
  const models: FaceModels = {
    detectShort: (input) => run(short, input, SHORT_RANGE.inputSize, ['Identity:0'])[0],
    detectFull: (input) => run(full, input, FULL_RANGE.inputSize, ['Identity:0'])[0],
    beginFull: (input) => {
      begun?.dispose();
      const pixels = tensor4d(input, [1, FULL_RANGE.inputSize, FULL_RANGE.inputSize, 3]);
      begun = full.execute(pixels, FULL_HALFWAY) as Tensor;
      pixels.dispose();
    },
    finishFull: () => {
      if (!begun) throw new Error('No look of the far detector was begun.');
      const result = full.execute({ [FULL_HALFWAY]: begun }, 'Identity:0') as Tensor;
      const numbers = result.dataSync<'float32'>();
      dispose([begun, result]);
      begun = null;
      return numbers;
    },
    landmarks: (input) => {
      const [belief, points] = run(mesh, input, LANDMARK_INPUT, ['output_faceflag', 'output_mesh']);
      return { belief: belief[0], points };
    },
    tensors: () => memory().numTensors - (begun ? 1 : 0),
    dispose: () => [begun, short, full, mesh].forEach((made) => made?.dispose()),
  };
  warmUp(models);
  return models;
}

async function loadModel(files: TrackerFiles, name: string, prepare?: (topology: object) => void): Promise<GraphModel> {
  const [description, weightData] = await Promise.all([files.read(`${name}.json`), files.read(`${name}.bin`)]);
  const json = JSON.parse(new TextDecoder().decode(description)) as io.ModelJSON;
  if (typeof json.modelTopology === 'object') prepare?.(json.modelTopology);
  return loadGraphModel({
    load: () =>
      Promise.resolve({
        modelTopology: json.modelTopology,
        format: json.format,
        signature: json.signature,
        userDefinedMetadata: json.userDefinedMetadata,
        weightSpecs: json.weightsManifest.flatMap((group) => group.weights),
        weightData,
      }),
  });
}

/** Runs a network on n x n pixels; every tensor made is freed again. */
function run(model: GraphModel, input: Float32Array, n: number, outputs: string[]): Float32Array[] {
  const pixels = tensor4d(input, [1, n, n, 3]);
  const results = model.execute(pixels, outputs);
  const tensors: Tensor[] = Array.isArray(results) ? results : [results];
  const numbers = tensors.map((tensor) => tensor.dataSync<'float32'>());
  dispose([pixels, ...tensors]);
  return numbers;
}

/** The first run of each network prepares its weights; do it before a viewer waits for it. */
function warmUp(models: FaceModels): void {
  models.detectShort(new Float32Array(SHORT_RANGE.inputSize ** 2 * 3));
  models.detectFull(new Float32Array(FULL_RANGE.inputSize ** 2 * 3));
  models.landmarks(new Float32Array(LANDMARK_INPUT ** 2 * 3));
}
