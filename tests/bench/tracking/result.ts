/** What an engine made of one frame; pixels of the frame. */
export interface Found {
  readonly rightEye: readonly [number, number];
  readonly leftEye: readonly [number, number];
  /** The distance between the eyes as the engine measures it. */
  readonly ipdPx: number;
}

/** One frame through one engine: what it found, the engine's own time, and the time until its answer was back on the page. */
export interface Look {
  readonly face: Found | null;
  readonly engineMs: number;
  readonly roundTripMs: number;
}

/** One frame through both engines, with the number it carries. */
export interface FrameResult {
  readonly number: number | null;
  readonly oriel: Look;
  readonly reference: Look;
}
