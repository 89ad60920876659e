import { ChangeDetectionStrategy, Component, effect, inject, input, model, signal, untracked } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { FailureNotice } from '../../core/failure-notice';
import { Submission } from '../../core/submission';
import { PhotoLibrary } from '../../photos/photo-library';
import { PhotoPicture } from '../../photos/photo-picture';

const searchAfterMs = 250;

/** The household's photos, to choose some of, in the order they are chosen. One that is still being prepared shows so, and can be chosen once it is ready. */
@Component({
  selector: 'oriel-photo-picker',
  imports: [MatButton, FailureNotice, PhotoPicture],
  providers: [PhotoLibrary],
  template: `
    <input #words type="search" placeholder="Search photos by name" aria-label="Search photos by name" (input)="search.set(words.value)" />
    <oriel-failure-notice [failure]="fetching.failure()" [retryable]="true" (retry)="load()" />
    @if (library.photos().length > 0) {
      <ul>
        @for (photo of library.photos(); track photo.id) {
          @let at = chosen().indexOf(photo.id);
          <li>
            <button
              type="button"
              [disabled]="photo.state !== 'ready'"
              [attr.aria-pressed]="at >= 0"
              [attr.aria-label]="photo.name + (photo.state === 'waiting' ? ', being prepared' : '')"
              [style.aspect-ratio]="photo.width / photo.height"
              (click)="toggle(photo.id)"
            >
              <oriel-photo-picture [photo]="photo" [edge]="320" />
              @if (at >= 0) {
                <span class="mark">{{ at + 1 }}</span>
              }
            </button>
          </li>
        }
      </ul>
      @if (library.hasMore()) {
        <button matButton type="button" [disabled]="fetching.busy()" (click)="more()">More photos</button>
      }
    } @else if (library.loaded()) {
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
  protected readonly library = inject(PhotoLibrary);
  protected readonly fetching = new Submission();
  protected readonly search = signal('');

  constructor() {
    effect((onCleanup) => {
      const timer = setTimeout(() => untracked(() => void this.load()), this.search() ? searchAfterMs : 0);
      onCleanup(() => clearTimeout(timer));
    });
  }

  protected toggle(id: string): void {
    const chosen = this.chosen();
    if (chosen.includes(id)) this.chosen.set(chosen.filter((other) => other !== id));
    else if (chosen.length < this.most()) this.chosen.set([...chosen, id]);
  }

  /** Until the list answers what is being searched for by then. */
  protected load(): Promise<void> {
    return this.fetching.run(async () => {
      let search: string;
      do {
        search = this.search();
        await this.library.open(search, false, this.householdId());
      } while (search !== this.search());
    });
  }

  protected more(): Promise<void> {
    return this.fetching.run(() => this.library.more());
  }
}
