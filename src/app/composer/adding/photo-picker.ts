import { ChangeDetectionStrategy, Component, effect, inject, input, model, signal, untracked } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { listPhotos, photoDerivative, type Photo } from '@oriel/shared/contracts/photos';
import { Api, addressOf } from '../../core/api';
import { type ApiFailure, toApiFailure } from '../../core/api-failure';
import { FailureNotice } from '../../core/failure-notice';

const PAGE = 60;

/** The household's photos, to choose some of, in the order they are chosen. */
@Component({
  selector: 'oriel-photo-picker',
  imports: [MatButton, FailureNotice],
  template: `
    <input #words type="search" placeholder="Search photos by name" aria-label="Search photos by name" (input)="search.set(words.value)" />
    <oriel-failure-notice [failure]="failure()" [retryable]="true" (retry)="begin(words.value)" />
    @if (photos().length > 0) {
      <ul>
        @for (photo of photos(); track photo.id) {
          @let at = chosen().indexOf(photo.id);
          <li>
            <button type="button" [attr.aria-pressed]="at >= 0" [attr.aria-label]="photo.name" (click)="toggle(photo.id)">
              <img [src]="thumbnail(photo)" alt="" loading="lazy" />
              @if (at >= 0) {
                <span class="mark">{{ at + 1 }}</span>
              }
            </button>
          </li>
        }
      </ul>
      @if (next()) {
        <button matButton type="button" (click)="more()">More photos</button>
      }
    } @else if (loaded()) {
      <p class="none">{{ search() ? 'No photo has that in its name.' : 'No photos here yet: upload some on the page Photos, or choose files above.' }}</p>
    }
  `,
  styleUrl: './photo-picker.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PhotoPicker {
  readonly householdId = input.required<string>();
  readonly most = input(64);
  readonly chosen = model<readonly string[]>([]);
  private readonly api = inject(Api);
  protected readonly search = signal('');
  protected readonly photos = signal<readonly Photo[]>([]);
  protected readonly next = signal<string | null>(null);
  protected readonly loaded = signal(false);
  protected readonly failure = signal<ApiFailure | null>(null);
  private asked = 0;

  constructor() {
    effect((onCleanup) => {
      const search = this.search();
      const timer = setTimeout(() => untracked(() => void this.begin(search)), search ? 250 : 0);
      onCleanup(() => clearTimeout(timer));
    });
  }

  protected thumbnail(photo: Photo): string {
    return addressOf(photoDerivative, { photoId: photo.id, edge: 320 });
  }

  protected toggle(id: string): void {
    const chosen = this.chosen();
    if (chosen.includes(id)) this.chosen.set(chosen.filter((other) => other !== id));
    else if (chosen.length < this.most()) this.chosen.set([...chosen, id]);
  }

  protected begin(search: string): Promise<void> {
    this.next.set(null);
    return this.fetch(search, []);
  }

  protected more(): Promise<void> {
    return this.fetch(this.search(), this.photos());
  }

  private async fetch(search: string, before: readonly Photo[]): Promise<void> {
    const asked = (this.asked += 1);
    this.failure.set(null);
    try {
      const reply = await this.api.call(listPhotos, {
        params: { householdId: this.householdId() },
        query: { limit: PAGE, search: search || undefined, after: this.next() ?? undefined },
      });
      if (asked !== this.asked) return;
      this.photos.set([...before, ...reply.photos.filter(({ state }) => state === 'ready')]);
      this.next.set(reply.next);
      this.loaded.set(true);
    } catch (error) {
      if (asked === this.asked) this.failure.set(toApiFailure(error));
    }
  }
}
