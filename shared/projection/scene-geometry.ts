import type { Glass, Point3, Rectangle, ViewingZone } from './types';

/** The geometry of a layer: its rectangle on the glass as the home eye sees it, and its depth. */
export interface PlacedLayer {
  readonly placed: Rectangle;
  readonly depthMm: number;
}

/** What a scene is composed for. */
export interface SceneSetting {
  readonly glass: Glass;
  readonly homeEye: Point3;
  readonly zone: ViewingZone;
}

/** A setting and what stands in it, in any order. */
export interface SceneGeometry extends SceneSetting {
  readonly layers: readonly PlacedLayer[];
}
