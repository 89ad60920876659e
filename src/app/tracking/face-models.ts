/** What the landmark model says of one region: its belief that a face is there, and 468 points x, y, z in pixels of its input. */
export interface RawLandmarks {
  readonly belief: number;
  readonly points: Float32Array;
}

/** The three networks, each from pixels prepared by a `Picture` to raw numbers. Injected, so that tracking is tested without a browser. */
export interface FaceModels {
  /** Near faces: 128 x 128 pixels of -1 to 1; see `SHORT_RANGE`. */
  detectShort(input: Float32Array): Float32Array;
  /** Small and far faces: 192 x 192 pixels of -1 to 1; see `FULL_RANGE`. */
  detectFull(input: Float32Array): Float32Array;
  /** The first half of the same work; what was begun before and not finished is dropped. */
  beginFull(input: Float32Array): void;
  /** The second half: the numbers `detectFull` would give for what was begun. @throws Error where nothing was begun. */
  finishFull(): Float32Array;
  /** Landmarks of a region that holds a face: 192 x 192 pixels of 0 to 1. */
  landmarks(input: Float32Array): RawLandmarks;
  /** Tensors alive: constant between frames, or something leaks. */
  tensors(): number;
  dispose(): void;
}
