import { DOCUMENT, Injectable, inject } from '@angular/core';
import type { LayerImage } from '@oriel/shared/contracts/scenes';
import { imageAddress } from './image-address';

/** Less than this of 255 is seen through: the pointer reaches what lies behind. */
const SEEN_THROUGH = 24;

interface Alpha {
  readonly width: number;
  readonly height: number;
  readonly values: Uint8Array;
}

/** Where layers are opaque, from their smallest derivatives, so that the pointer takes the layer one sees and not a clear corner. */
@Injectable()
export class LayerAlpha {
  private readonly document = inject(DOCUMENT);
  private readonly known = new Map<string, Alpha | null>();

  /** `across` and `down` run from 0 to 1 over the image. Until the image is here, all of it counts as opaque. */
  opaqueAt(image: LayerImage, across: number, down: number): boolean {
    if (across < 0 || across > 1 || down < 0 || down > 1) return false;
    const alpha = this.known.get(image.id);
    if (!alpha) return true;
    const x = Math.min(Math.floor(across * alpha.width), alpha.width - 1);
    const y = Math.min(Math.floor(down * alpha.height), alpha.height - 1);
    return alpha.values[y * alpha.width + x] > SEEN_THROUGH;
  }

  async learn(image: LayerImage): Promise<void> {
    if (this.known.has(image.id)) return;
    this.known.set(image.id, null);
    try {
      const picture = new Image();
      picture.src = imageAddress(image, 320);
      await picture.decode();
      this.known.set(image.id, this.read(picture));
    } catch {
      this.known.delete(image.id);
    }
  }

  private read(picture: HTMLImageElement): Alpha | null {
    const canvas = this.document.createElement('canvas');
    [canvas.width, canvas.height] = [picture.naturalWidth, picture.naturalHeight];
    const drawing = canvas.getContext('2d', { willReadFrequently: true });
    if (!drawing) return null;
    drawing.drawImage(picture, 0, 0);
    const { data } = drawing.getImageData(0, 0, canvas.width, canvas.height);
    return { width: canvas.width, height: canvas.height, values: Uint8Array.from({ length: data.length / 4 }, (_, i) => data[4 * i + 3]) };
  }
}
