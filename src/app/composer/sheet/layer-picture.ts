import { ChangeDetectionStrategy, Component, effect, input, output, signal, untracked } from '@angular/core';
import type { DerivativeEdge } from '@oriel/shared/contracts/photos';
import type { LayerImage } from '@oriel/shared/contracts/scenes';
import { imageAddress } from './image-address';

/** How long to wait before asking again for a picture that did not come, ms. */
const AGAIN_MS = 5000;
const SMALL: DerivativeEdge = 320;

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
  readonly edge = input.required<DerivativeEdge>();
  /** There is something to see, or to say, of the picture. */
  readonly settled = output();
  protected readonly source = signal('');
  protected readonly missing = signal(false);

  constructor() {
    effect((onCleanup) => {
      const [image, edge] = [this.image(), this.edge()];
      const wanted = new AbortController();
      onCleanup(() => wanted.abort());
      untracked(() => void this.bring(image, edge, wanted.signal));
    });
  }

  /** Something to see at once, then what is sharp, for as long as it is wanted. */
  private async bring(image: LayerImage, edge: DerivativeEdge, wanted: AbortSignal): Promise<void> {
    if (!this.source() && edge > SMALL) await this.show(imageAddress(image, SMALL), wanted);
    while (!wanted.aborted && !(await this.show(imageAddress(image, edge), wanted))) await pause(AGAIN_MS);
  }

  /** Returns whether it came. */
  private async show(address: string, wanted: AbortSignal): Promise<boolean> {
    const picture = new Image();
    picture.src = address;
    const came = await picture.decode().then(
      () => true,
      () => false,
    );
    if (wanted.aborted) return came;
    this.missing.set(!came);
    if (came) this.source.set(address);
    this.settled.emit();
    return came;
  }
}

const pause = (ms: number) => new Promise<void>((resolve) => setTimeout(resolve, ms));
