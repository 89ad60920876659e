import { ChangeDetectionStrategy, Component, DestroyRef, effect, inject, input, signal, untracked } from '@angular/core';
import type { LayerImage } from '@oriel/shared/contracts/scenes';
import { type Edge, imageAddress } from './image-address';

/** How long to wait before asking again for a picture that did not come, ms. */
const AGAIN_MS = 5000;
const SMALL: Edge = 320;

/** The picture of one layer: a sharper one replaces it only once it is decoded, and one that did not come is asked for again. */
@Component({
  selector: 'oriel-layer-picture',
  template: `
    @if (source(); as src) {
      <img [src]="src" alt="" draggable="false" />
    } @else if (missing()) {
      <span>The picture has not come. Trying again.</span>
    }
  `,
  styles: `
    :host { display: block; }
    img { display: block; width: 100%; height: 100%; }
    span { display: grid; place-items: center; height: 100%; border: 4px dashed var(--not-clear); background: var(--sheet); color: var(--not-clear); font-size: 26px; }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LayerPicture {
  readonly image = input.required<LayerImage>();
  readonly edge = input.required<Edge>();
  protected readonly source = signal('');
  protected readonly missing = signal(false);
  private timer: ReturnType<typeof setTimeout> | undefined;

  constructor() {
    effect(() => {
      const [image, edge] = [this.image(), this.edge()];
      untracked(() => void this.bringSmallFirst(image, edge));
    });
    inject(DestroyRef).onDestroy(() => clearTimeout(this.timer));
  }

  /** Something to see at once, then what is sharp. */
  private async bringSmallFirst(image: LayerImage, edge: Edge): Promise<void> {
    if (!this.source() && edge > SMALL) await this.bring(imageAddress(image, SMALL), image);
    await this.bring(imageAddress(image, edge), image);
  }

  private async bring(address: string, image: LayerImage): Promise<void> {
    clearTimeout(this.timer);
    const picture = new Image();
    picture.src = address;
    try {
      await picture.decode();
    } catch {
      this.missing.set(true);
      this.timer = setTimeout(() => void this.bring(address, image), AGAIN_MS);
      return;
    }
    if (image !== this.image() && image.id !== this.image().id) return;
    this.missing.set(false);
    this.source.set(address);
  }
}
