/** What an engine made of one frame. */
export interface Found {
  /** The subject's own right and left eye; pixels of the frame. */
  readonly rightEye: readonly [number, number];
  readonly leftEye: readonly [number, number];
  /** The distance between the eyes as the engine measures it, in pixels. */
  readonly ipdPx: number;
  /** The midpoint between the eyes in camera millimetres, x right, y down, z away, but for one factor for the viewer's size. */
  readonly eyeMm: readonly [number, number, number];
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
