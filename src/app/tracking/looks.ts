import { detailAlong } from './detail-along';
import { decodeDetections, type Detection } from './detection';
import { anchorsOf, FULL_RANGE, SHORT_RANGE } from './detector-anchors';
import { LANDMARK_COUNT, LANDMARK_INPUT, placeLandmarks } from './face-landmarks';
import type { FaceModels } from './face-models';
import type { Picture } from './picture';
import type { Region } from './region';
import { mergeDetections } from './suppression';

/** Time spent since the last `reset`, by stage. */
export interface LookTimes {
  cropMs: number;
  detectMs: number;
  landmarksMs: number;
}

/** The three ways to look at a square piece of a frame. Keeps its buffers: only a few small objects are made for each look. */
export class Looks {
  readonly times: LookTimes = { cropMs: 0, detectMs: 0, landmarksMs: 0 };
  /** Landmarks of the last `landmarks` look, in frame pixels, x, y, z each. */
  readonly points = new Float64Array(LANDMARK_COUNT * 3);
  private readonly shortAnchors = anchorsOf(SHORT_RANGE);
  private readonly fullAnchors = anchorsOf(FULL_RANGE);
  private readonly shortInput = new Float32Array(SHORT_RANGE.inputSize ** 2 * 3);
  private readonly fullInput = new Float32Array(FULL_RANGE.inputSize ** 2 * 3);
  private begunRegion: Region = { cx: 0, cy: 0, size: 1, angleRad: 0 };
  private landmarkAngleRad = 0;
  private readonly landmarkInput = new Float32Array(LANDMARK_INPUT ** 2 * 3);

  constructor(private readonly models: FaceModels) {}

  reset(): void {
    this.times.cropMs = this.times.detectMs = this.times.landmarksMs = 0;
  }

  /** Faces the short-range detector sees, best first: right for a face that fills a third of the region or more. */
  short(picture: Picture, region: Region, threshold: number): Detection[] {
    const output = this.timed(picture, region, SHORT_RANGE.inputSize, -1, this.shortInput, 'detectMs', (input) =>
      this.models.detectShort(input),
    );
    return mergeDetections(decodeDetections(output, this.shortAnchors, SHORT_RANGE.inputSize, region, threshold));
  }

  /** Faces the full-range detector sees, best first: small ones too, but its sizes want confirming. */
  full(picture: Picture, region: Region, threshold: number): Detection[] {
    const output = this.timed(picture, region, FULL_RANGE.inputSize, -1, this.fullInput, 'detectMs', (input) =>
      this.models.detectFull(input),
    );
    return mergeDetections(decodeDetections(output, this.fullAnchors, FULL_RANGE.inputSize, region, threshold));
  }

  /** Does half of a full-range look now; `finishFull` does the rest, of what was seen now, in a later frame. */
  beginFull(picture: Picture, region: Region): void {
    this.begunRegion = region;
    this.timed(picture, region, FULL_RANGE.inputSize, -1, this.fullInput, 'detectMs', (input) =>
      this.models.beginFull(input),
    );
  }

  /** The faces that the look begun last sees, best first, as `full` gives them. */
  finishFull(threshold: number): Detection[] {
    const begun = performance.now();
    const output = this.models.finishFull();
    this.times.detectMs += performance.now() - begun;
    return mergeDetections(
      decodeDetections(output, this.fullAnchors, FULL_RANGE.inputSize, this.begunRegion, threshold),
    );
  }

  /** Places `points` for the face in this region; returns the model's belief that there is one. */
  landmarks(picture: Picture, region: Region): number {
    const { belief, points } = this.timed(
      picture,
      region,
      LANDMARK_INPUT,
      0,
      this.landmarkInput,
      'landmarksMs',
      (input) => this.models.landmarks(input),
    );
    placeLandmarks(points, region, this.points);
    this.landmarkAngleRad = region.angleRad;
    return belief;
  }

  /** Detail along a direction of the frame against detail across it, in the region where landmarks were placed last. */
  readonly detailAlong = (directionRad: number): number =>
    detailAlong(this.landmarkInput, LANDMARK_INPUT, directionRad - this.landmarkAngleRad);

  private timed<T>(
    picture: Picture,
    region: Region,
    n: number,
    low: -1 | 0,
    input: Float32Array,
    stage: 'detectMs' | 'landmarksMs',
    run: (input: Float32Array) => T,
  ): T {
    const begun = performance.now();
    picture.sample(region, n, low, low === 0 ? 'repeat' : 'black', input);
    const sampled = performance.now();
    const result = run(input);
    this.times.cropMs += sampled - begun;
    this.times[stage] += performance.now() - sampled;
    return result;
  }
}
