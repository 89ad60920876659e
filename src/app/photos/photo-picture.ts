import { ChangeDetectionStrategy, Component, computed, input, linkedSignal } from '@angular/core';
import { type DerivativeEdge, type Photo, photoDerivative } from '@oriel/shared/contracts/photos';
import { thumbHashToAverageRGBA, thumbHashToDataURL } from 'thumbhash';
import { addressOf } from '../core/api';

/** A photo at some size: its placeholder at once, the derivative over it, and words while there is none. */
@Component({
  selector: 'oriel-photo-picture',
  template: `
    @if (photo().state === 'ready') {
      @if (wanted()) {
        <img [src]="address()" alt="" decoding="async" draggable="false" [class.here]="loaded()" (load)="loaded.set(true)" />
      }
    } @else {
      <span>{{ photo().state === 'failed' ? (photo().problem ?? 'This photo could not be prepared.') : 'Being prepared…' }}</span>
    }
  `,
  styles: `
    :host { display: grid; grid-template: minmax(0, 1fr) / minmax(0, 1fr); place-items: center; width: 100%; height: 100%; overflow: hidden; background: var(--zone) center / 100% 100% no-repeat; }
    img { width: 100%; height: 100%; object-fit: cover; opacity: 0; transition: opacity var(--ease); }
    .here { opacity: 1; }
    span { padding: 8px; font-size: 12px; color: var(--pencil); text-align: center; }
  `,
  host: { '[style.background-image]': 'placeholder()', '[style.background-color]': 'colour()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PhotoPicture {
  readonly photo = input.required<Photo>();
  readonly edge = input.required<DerivativeEdge>();
  protected readonly address = computed(() => addressOf(photoDerivative, { photoId: this.photo().id, edge: this.edge() }));
  /** Whether the picture is not to be fetched yet: it would have passed before it came. */
  readonly held = input(false);
  /** Once fetched, it stays. */
  protected readonly wanted = linkedSignal<{ address: string; held: boolean }, boolean>({
    source: () => ({ address: this.address(), held: this.held() }),
    computation: ({ address, held }, before) => !held || (before !== undefined && before.value && before.source.address === address),
  });
  /** Whether the picture at this address is here: until then the one before it is not to be taken for it. */
  protected readonly loaded = linkedSignal({ source: this.address, computation: () => false });
  private readonly hash = computed(() => {
    const { placeholder, hasAlpha } = this.photo();
    // It would show through what is transparent.
    if (!placeholder || (hasAlpha && this.loaded())) return null;
    return Uint8Array.from(atob(placeholder), (character) => character.charCodeAt(0));
  });
  /** In place of what is held: a colour costs next to nothing. */
  protected readonly colour = computed(() => {
    const hash = this.hash();
    if (!hash || this.wanted()) return null;
    const { r, g, b, a } = thumbHashToAverageRGBA(hash);
    return `rgb(${[r, g, b].map((share) => Math.round(255 * share)).join(' ')} / ${a})`;
  });
  protected readonly placeholder = computed(() => {
    const hash = this.hash();
    return hash && this.wanted() ? `url(${thumbHashToDataURL(hash)})` : null;
  });
}
