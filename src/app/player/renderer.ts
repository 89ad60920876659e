import type { DerivativeEdge } from '@oriel/shared/contracts/photos';
import type { Point3 } from '@oriel/shared/projection/types';
import type { SceneOnScreen } from './scene-on-screen';

export type RendererName = 'css' | 'three';

/** What a renderer holds; the counts are all zero after `dispose`. */
export interface RendererFacts {
  readonly name: RendererName;
  readonly layers: number;
  /** Decoded pictures, bytes, without mipmaps. */
  readonly pictureBytes: number;
  /** What the graphics side holds: pictures with their mipmaps, and what they are drawn into; bytes, computed. */
  readonly graphicsBytes: number;
  /** Things that must be freed: elements, or textures and geometries. */
  readonly held: number;
  /** Whether every layer shows its sharp picture. */
  readonly sharp: boolean;
}

/** The names of layers whose picture did not come, after several tries. */
export interface LoadOutcome {
  readonly missing: readonly string[];
}

/** The address of a layer's picture. */
export type PictureAddress = (imageId: string, edge: DerivativeEdge) => string;

/** Draws one scene in an element. Both implementations are fed by `sceneOnScreen` and put every layer where `placeLayer` says. */
export interface Renderer {
  readonly facts: RendererFacts;
  /**
   * Settles when the small pictures are there, and shows nothing before; the sharp ones follow by themselves, each decoded before
   * it is swapped in.
   * Takes the place of what was loaded before.
   */
  load(scene: SceneOnScreen): Promise<LoadOutcome>;
  /** The same layers in another area; sharper pictures are fetched where the new area can show them. */
  resize(scene: SceneOnScreen): void;
  /** Draws what this eye (mm from the centre of the stage) sees. */
  draw(eye: Point3): void;
  dispose(): void;
}
