/** One grid of anchors of a detector: `cells` x `cells` cell centres, `each` anchors at every one. */
export interface AnchorGrid {
  readonly cells: number;
  readonly each: number;
}

/** A face detector's input size in pixels and its anchors, as read from the public model descriptions of MediaPipe face detection. */
export interface DetectorShape {
  readonly inputSize: number;
  readonly grids: readonly AnchorGrid[];
}

/** For near faces: 16 x 16 x 2 + 8 x 8 x 6 = 896 anchors. */
export const SHORT_RANGE: DetectorShape = {
  inputSize: 128,
  grids: [
    { cells: 16, each: 2 },
    { cells: 8, each: 6 },
  ],
};

/** For small and far faces: 48 x 48 = 2304 anchors. */
export const FULL_RANGE: DetectorShape = { inputSize: 192, grids: [{ cells: 48, each: 1 }] };

/** Anchor centres as x, y pairs in 0 to 1 of the input, grid by grid, row by row. */
export function anchorsOf(shape: DetectorShape): Float32Array {
  const anchors = new Float32Array(2 * shape.grids.reduce((sum, grid) => sum + grid.cells * grid.cells * grid.each, 0));
  let at = 0;
  for (const { cells, each } of shape.grids) {
    for (let row = 0; row < cells; row++) {
      for (let column = 0; column < cells; column++) {
        for (let i = 0; i < each; i++) {
          anchors[at++] = (column + 0.5) / cells;
          anchors[at++] = (row + 0.5) / cells;
        }
      }
    }
  }
  return anchors;
}
