import type { DerivativeEdge } from '@oriel/shared/contracts/photos';
import type { Point3 } from '@oriel/shared/projection/types';
import { pixelBytes } from './graphics-bytes';
import { LayerPictures, type PictureShelf } from './layer-pictures';
import { type PlacedOnStage, placeLayer } from './place-layer';
import type { LoadOutcome, PictureAddress, Renderer, RendererFacts } from './renderer';
import type { LayerOnScreen, SceneOnScreen, Stage } from './scene-on-screen';

/** A layer's element keeps a size in whole px, so that the browser rounds nothing; its transform carries the exact one. */
interface DrawnLayer {
  layer: LayerOnScreen;
  element: HTMLImageElement | null;
  widthPx: number;
  heightPx: number;
}

/**
 * Draws layers as images under transforms. Planes parallel to the glass need one scale and one offset each, so that this is exact; without
 * a graphics processor it costs an eighth of WebGL. A frame makes one string a layer, which the style asks for, and nothing else.
 */
export class CssRenderer implements Renderer, PictureShelf<HTMLImageElement> {
  readonly greatestPx = Infinity;
  private readonly element: HTMLElement;
  private readonly placed: PlacedOnStage = { leftPx: 0, topPx: 0, widthPx: 0, heightPx: 0 };
  private readonly eye = { x: 0, y: 0, z: 1 };
  private drawn: DrawnLayer[] = [];
  private stage: Stage | null = null;
  private pictures: LayerPictures<HTMLImageElement> | null = null;

  constructor(
    host: HTMLElement,
    private readonly addressOf: PictureAddress,
  ) {
    this.element = host.ownerDocument.createElement('div');
    this.element.style.cssText = 'position:absolute;overflow:hidden;contain:strict';
    host.append(this.element);
  }

  get facts(): RendererFacts {
    return {
      name: 'css',
      layers: this.drawn.length,
      pictureBytes: this.pictures?.bytes(pixelBytes) ?? 0,
      graphicsBytes: (this.pictures?.bytes(pixelBytes) ?? 0) + this.rasterBytes(),
      held: this.element.childElementCount + (this.element.isConnected ? 1 : 0),
      sharp: this.pictures?.sharp ?? false,
    };
  }

  async load(scene: SceneOnScreen): Promise<LoadOutcome> {
    this.clear();
    this.element.style.visibility = 'hidden';
    this.drawn = scene.layers.map((layer) => ({ layer, element: null, widthPx: 1, heightPx: 1 }));
    copyEye(scene.homeEye, this.eye);
    const pictures = (this.pictures = new LayerPictures(scene.layers, this));
    this.fit(scene);
    const missing = await pictures.loadFirst();
    this.element.style.visibility = '';
    pictures.sharpen();
    return { missing };
  }

  resize(scene: SceneOnScreen): void {
    this.drawn.forEach((drawn, index) => (drawn.layer = scene.layers[index]));
    this.fit(scene);
    this.pictures?.sharpen(scene.layers);
  }

  draw(eye: Point3): void {
    copyEye(eye, this.eye);
    for (const drawn of this.drawn) this.drawLayer(drawn);
  }

  dispose(): void {
    this.clear();
    this.element.remove();
  }

  fetch(imageId: string, edge: DerivativeEdge, signal: AbortSignal): Promise<HTMLImageElement> {
    const image = this.element.ownerDocument.createElement('img');
    image.alt = '';
    image.draggable = false;
    image.src = this.addressOf(imageId, edge);
    return new Promise((resolve, reject) => {
      const giveUp = () => reject(signal.reason);
      signal.addEventListener('abort', giveUp, { once: true });
      image
        .decode()
        .then(() => resolve(image), reject)
        .finally(() => signal.removeEventListener('abort', giveUp));
    });
  }

  put(index: number, image: HTMLImageElement): void {
    const drawn = this.drawn[index];
    image.style.cssText = `position:absolute;left:0;top:0;max-width:none;transform-origin:0 0;will-change:transform;z-index:${index};opacity:${drawn.layer.opacity}`;
    const before = drawn.element;
    drawn.element = image;
    this.size(drawn);
    if (before) before.replaceWith(image);
    else this.element.append(image);
  }

  /** Letting go is enough. Taking its `src` away, as one might, keeps a decoded image alive for good in Chromium (measured). */
  discard(): void {
    return;
  }

  private fit(scene: SceneOnScreen): void {
    const { stage } = scene;
    this.stage = stage;
    const { style } = this.element;
    style.left = `${stage.leftPx}px`;
    style.top = `${stage.topPx}px`;
    style.width = `${stage.widthPx}px`;
    style.height = `${stage.heightPx}px`;
    for (const drawn of this.drawn) this.size(drawn);
  }

  private size(drawn: DrawnLayer): void {
    drawn.widthPx = Math.max(1, Math.round(drawn.layer.homeWidthPx));
    drawn.heightPx = Math.max(1, Math.round(drawn.layer.homeHeightPx));
    if (!drawn.element) return;
    drawn.element.style.width = `${drawn.widthPx}px`;
    drawn.element.style.height = `${drawn.heightPx}px`;
    this.drawLayer(drawn);
  }

  /** Under a transform of its own, each element is a surface of its size. */
  private rasterBytes(): number {
    const ratio = this.stage?.deviceRatio ?? 1;
    return this.drawn.reduce((sum, { element, widthPx, heightPx }) => sum + (element ? pixelBytes(widthPx * ratio, heightPx * ratio) : 0), 0);
  }

  private drawLayer({ layer, element, widthPx, heightPx }: DrawnLayer): void {
    if (!element || !this.stage) return;
    const { placed } = this;
    placeLayer(layer, this.eye, this.stage, placed);
    element.style.transform = `matrix(${placed.widthPx / widthPx},0,0,${placed.heightPx / heightPx},${placed.leftPx},${placed.topPx})`;
  }

  private clear(): void {
    this.pictures?.stop();
    this.pictures = null;
    this.element.replaceChildren();
    this.drawn = [];
  }
}

function copyEye(from: Point3, to: { x: number; y: number; z: number }): void {
  to.x = from.x;
  to.y = from.y;
  to.z = from.z;
}
