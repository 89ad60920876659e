import { DestroyRef, Injectable, computed, inject, signal } from '@angular/core';
import { type Photo, binPhotos, listPhotos, readPhotos, restorePhotos } from '@oriel/shared/contracts/photos';
import { Api } from '../core/api';
import { Session } from '../core/session';

const askAgainMs = 1500;
const pageOf = 500;

/** A household's photos as far as they are fetched, newest taken first; either those at hand or those in the bin. */
@Injectable()
export class PhotoLibrary {
  private readonly api = inject(Api);
  private readonly session = inject(Session);
  private readonly fetched = signal<readonly Photo[]>([]);
  private readonly next = signal<string | null>(null);
  private fetching: Promise<void> | null = null;
  private question = { search: '', bin: false, householdId: '' };
  private timer: ReturnType<typeof setTimeout> | undefined;

  readonly photos = this.fetched.asReadonly();
  readonly total = signal(0);
  readonly loaded = signal(false);
  readonly hasMore = computed(() => this.next() !== null);
  readonly waiting = computed(() => this.fetched().filter((photo) => photo.state === 'waiting'));

  constructor() {
    inject(DestroyRef).onDestroy(() => clearTimeout(this.timer));
  }

  /** Starts over with another question; of the household one is in, unless another is named. */
  async open(search: string, bin: boolean, householdId = this.session.householdId()): Promise<void> {
    this.question = { search, bin, householdId };
    const asked = this.question;
    // Where the list before went on says nothing of this one.
    this.next.set(null);
    const page = await this.api.call(listPhotos, { params: this.here(), query: this.query() });
    if (asked !== this.question) return;
    this.fetched.set(page.photos);
    this.next.set(page.next);
    this.total.set(page.total);
    this.loaded.set(true);
    this.watchWaiting();
  }

  /** Fetches the next page, if there is one and it is not being fetched. */
  more(): Promise<void> {
    if (!this.next()) return Promise.resolve();
    this.fetching ??= this.fetchMore().finally(() => (this.fetching = null));
    return this.fetching;
  }

  /** Fetches page after page until all are here, so that the sheet is as long as it will be and any part of it can be gone to. */
  async rest(): Promise<void> {
    while (this.hasMore()) await this.more();
  }

  /** Takes in a photo just uploaded, in its place by date; beyond what is fetched it comes with its own page. */
  take(photo: Photo): void {
    if (this.question.bin || this.question.search) return;
    const others = this.fetched().filter((known) => known.id !== photo.id);
    if (others.length === this.fetched().length) this.total.update((n) => n + 1);
    const at = others.findIndex((known) => isBefore(photo, known));
    if (at >= 0) this.fetched.set([...others.slice(0, at), photo, ...others.slice(at)]);
    else this.fetched.set(this.next() ? others : [...others, photo]);
    this.watchWaiting();
  }

  async bin(ids: readonly string[]): Promise<void> {
    await this.inThousands(ids, (photoIds) => this.api.call(binPhotos, { params: this.here(), body: { photoIds } }));
    this.drop(ids);
  }

  async restore(ids: readonly string[]): Promise<void> {
    await this.inThousands(ids, (photoIds) => this.api.call(restorePhotos, { params: this.here(), body: { photoIds } }));
    this.drop(ids);
  }

  private async inThousands(ids: readonly string[], send: (some: string[]) => Promise<unknown>): Promise<void> {
    for (let i = 0; i < ids.length; i += 1000) await send(ids.slice(i, i + 1000));
  }

  private drop(ids: readonly string[]): void {
    const gone = new Set(ids);
    this.fetched.update((photos) => photos.filter((photo) => !gone.has(photo.id)));
    this.total.update((n) => Math.max(0, n - gone.size));
  }

  private async fetchMore(): Promise<void> {
    const asked = this.question;
    const page = await this.api.call(listPhotos, { params: this.here(), query: { ...this.query(), after: this.next() ?? undefined } });
    if (asked !== this.question) return;
    const known = new Set(this.fetched().map((photo) => photo.id));
    this.fetched.update((photos) => [...photos, ...page.photos.filter((photo) => !known.has(photo.id))]);
    this.next.set(page.next);
    this.watchWaiting();
  }

  /** Asks for photos whose derivatives are being made until they are ready. */
  private watchWaiting(): void {
    clearTimeout(this.timer);
    if (this.waiting().length > 0) this.timer = setTimeout(() => void this.askForWaiting(), askAgainMs);
  }

  private async askForWaiting(): Promise<void> {
    const photoIds = this.waiting().slice(0, 200).map((photo) => photo.id);
    const answer = await this.api.call(readPhotos, { params: this.here(), body: { photoIds } }).catch(() => null);
    if (answer) {
      const fresh = new Map(answer.photos.map((photo) => [photo.id, photo]));
      this.fetched.update((photos) => photos.map((photo) => fresh.get(photo.id) ?? photo));
    }
    this.watchWaiting();
  }

  private query() {
    return { search: this.question.search || undefined, bin: this.question.bin ? 'true' : 'false', limit: pageOf };
  }

  private here() {
    return { householdId: this.question.householdId };
  }
}

const isBefore = (a: Photo, b: Photo) => Date.parse(a.takenAt) > Date.parse(b.takenAt) || (a.takenAt === b.takenAt && a.id > b.id);
