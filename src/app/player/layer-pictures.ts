import type { DerivativeEdge } from '@oriel/shared/contracts/photos';
import { decodedBytes, firstEdge, sharpEdge } from './picture-edge';
import { loadPicture } from './picture-load';
import type { LayerOnScreen } from './scene-on-screen';

/** How a renderer gets and keeps pictures. */
export interface PictureShelf<P> {
  /** Largest edge it can hold, px. */
  readonly greatestPx: number;
  /** Fetches and decodes; rejects when that fails. */
  fetch(imageId: string, edge: DerivativeEdge, signal: AbortSignal): Promise<P>;
  /** Shows a decoded picture as the layer at `index`, in place of the one before. */
  put(index: number, picture: P): void;
  /** Frees a picture that came too late to be shown. */
  discard(picture: P): void;
}

/** The pictures of one scene's layers on their way to a renderer: a small one first, then the sharp one. */
export class LayerPictures<P> {
  private readonly leaving = new AbortController();
  private readonly edges: (DerivativeEdge | 0)[];
  private sharpening: Promise<void> | null = null;

  constructor(
    private layers: readonly LayerOnScreen[],
    private readonly shelf: PictureShelf<P>,
  ) {
    this.edges = layers.map(() => 0);
  }

  /** What the pictures shown take up together, by width and height in px of each. */
  bytes(bytesOf: (widthPx: number, heightPx: number) => number): number {
    return this.layers.reduce((sum, layer, index) => sum + (this.edges[index] ? decodedBytes(layer, this.edges[index], bytesOf) : 0), 0);
  }

  get sharp(): boolean {
    return this.layers.every((layer, index) => this.edges[index] >= this.sharpEdgeOf(layer));
  }

  /** Loads the small pictures, all at once; gives the names of layers for which none came. */
  async loadFirst(): Promise<string[]> {
    await Promise.all(this.layers.map((_layer, index) => this.bring(index, firstEdge)));
    if (this.leaving.signal.aborted) return [];
    return this.layers.filter((_layer, index) => !this.edges[index]).map((layer) => layer.name);
  }

  /** Brings the sharp pictures one after another, so that decoding never piles up; called again for layers in another area. */
  sharpen(layers: readonly LayerOnScreen[] = this.layers): void {
    this.layers = layers;
    this.sharpening ??= this.bringSharp().finally(() => (this.sharpening = null));
  }

  /** Stops what is on its way; what comes yet is discarded. */
  stop(): void {
    this.leaving.abort();
  }

  private async bringSharp(): Promise<void> {
    for (let index = 0; index < this.layers.length && !this.leaving.signal.aborted; index++) {
      const edge = this.sharpEdgeOf(this.layers[index]);
      if (this.edges[index] < edge) await this.bring(index, edge);
    }
  }

  private async bring(index: number, edge: DerivativeEdge): Promise<void> {
    const { signal } = this.leaving;
    const picture = await loadPicture(() => this.shelf.fetch(this.layers[index].image.id, edge, signal), signal);
    if (picture === null) return;
    if (signal.aborted) return this.shelf.discard(picture);
    this.shelf.put(index, picture);
    this.edges[index] = edge;
  }

  private sharpEdgeOf(layer: LayerOnScreen): DerivativeEdge {
    return sharpEdge(layer, this.shelf.greatestPx);
  }
}
