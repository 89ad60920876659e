import { createRequire } from 'node:module';

/** The part of OpenCV.js used as a reference. */
export interface Mat {
  readonly data64F: Float64Array;
  delete(): void;
}

export interface OpenCv {
  readonly CV_64F: number;
  readonly SOLVEPNP_ITERATIVE: number;
  matFromArray(rows: number, columns: number, type: number, data: ArrayLike<number>): Mat;
  Mat: new () => Mat;
  Rodrigues(from: Mat, to: Mat): void;
  projectPoints(points: Mat, turn: Mat, place: Mat, camera: Mat, distortion: Mat, pixels: Mat): void;
  solvePnP(
    points: Mat,
    pixels: Mat,
    camera: Mat,
    distortion: Mat,
    turn: Mat,
    place: Mat,
    guess: boolean,
    method: number,
  ): boolean;
  onRuntimeInitialized?: () => void;
}

/** Starts OpenCV.js. Its module object has a `then` that never settles, so it is handed over in a holder and never awaited. */
export function startOpenCv(): Promise<{ cv: OpenCv }> {
  const cv = createRequire(import.meta.url)('@techstark/opencv-js') as OpenCv;
  return new Promise((resolve) => {
    if (typeof cv.Mat === 'function') resolve({ cv });
    else cv.onRuntimeInitialized = () => resolve({ cv });
  });
}
