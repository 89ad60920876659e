import { HttpClient, HttpEventType } from '@angular/common/http';
import { Injectable, computed, effect, inject, signal, untracked } from '@angular/core';
import { type Observable, Subject, type Subscription } from 'rxjs';
import { type Photo, photoMaxBytes, uploadPhoto } from '@oriel/shared/contracts/photos';
import { addressOf } from '../../core/api';
import { ApiFailure, toApiFailure } from '../../core/api-failure';
import { clockReading } from '../../core/moments';
import { Session } from '../../core/session';
import { type Upload, isOver } from './upload';

const atOnce = 3;
const goOnAfterMs = 4000;

/**
 * Sends files one beside another, wherever in the product the person goes meanwhile. A lost network interrupts and goes on when it is
 * back; what the server refuses stays in the list with its reason.
 */
@Injectable({ providedIn: 'root' })
export class UploadQueue {
  private readonly http = inject(HttpClient);
  private readonly session = inject(Session);
  private readonly list = signal<readonly Upload[]>([]);
  private readonly sending = new Map<Upload, Subscription>();
  private readonly keptPhotos = new Subject<Photo>();
  private lastId = 0;

  readonly uploads = this.list.asReadonly();
  readonly kept: Observable<Photo> = this.keptPhotos.asObservable();
  readonly open = computed(() => this.list().filter((upload) => !isOver(upload.state())).length);
  /** 0 to 1 of all bytes in the list. */
  readonly sent = computed(() => {
    const counted = this.list().filter((upload) => upload.state() !== 'cancelled');
    const all = counted.reduce((sum, { file }) => sum + file.size, 0);
    const done = counted.reduce((sum, upload) => sum + upload.file.size * (isOver(upload.state()) ? 1 : upload.sent()), 0);
    return all > 0 ? done / all : 1;
  });

  constructor() {
    // Whoever signs in next is not to see or send what another person chose.
    effect(() => {
      if (this.session.account()) return;
      untracked(() => {
        this.cancelAll();
        this.clear();
      });
    });
    addEventListener('online', () => this.goOn());
    addEventListener('beforeunload', (event) => {
      if (this.open() > 0) event.preventDefault();
    });
  }

  add(files: readonly File[]): void {
    const householdId = this.session.householdId();
    const added = files.map((file): Upload => ({
      id: ++this.lastId,
      householdId,
      file,
      state: signal('waiting'),
      sent: signal(0),
      failure: signal(null),
      photo: signal(null),
    }));
    this.list.update((uploads) => [...uploads, ...added]);
    added.filter(({ file }) => file.size > photoMaxBytes).forEach((upload) => this.refuse(upload, tooLarge));
    this.pump();
  }

  cancel(upload: Upload): void {
    this.end(upload);
    this.pump();
  }

  retry(upload: Upload): void {
    upload.failure.set(null);
    upload.sent.set(0);
    upload.state.set('waiting');
    this.pump();
  }

  /** Takes one that is over off the list. */
  drop(upload: Upload): void {
    this.list.update((uploads) => uploads.filter((known) => known !== upload || !isOver(known.state())));
  }

  cancelAll(): void {
    for (const upload of this.list()) if (!isOver(upload.state())) this.end(upload);
  }

  /** Takes what is over off the list. */
  clear(): void {
    this.list.update((uploads) => uploads.filter((upload) => !isOver(upload.state())));
  }

  private end(upload: Upload): void {
    this.sending.get(upload)?.unsubscribe();
    this.sending.delete(upload);
    upload.state.set('cancelled');
  }

  private goOn(): void {
    for (const upload of this.list()) if (upload.state() === 'interrupted') this.retry(upload);
  }

  private pump(): void {
    for (const upload of this.list()) {
      if (this.sending.size >= atOnce) return;
      if (upload.state() === 'waiting') this.send(upload);
    }
  }

  private send(upload: Upload): void {
    upload.state.set('sending');
    const form = new FormData();
    form.set('lastModified', clockReading(new Date(upload.file.lastModified)));
    form.set('file', upload.file);
    const address = addressOf(uploadPhoto, { householdId: upload.householdId });
    const sending = this.http.post<unknown>(address, form, { reportProgress: true, observe: 'events' }).subscribe({
      next: (event) => {
        if (event.type === HttpEventType.UploadProgress && event.total) upload.sent.set(event.loaded / event.total);
        if (event.type === HttpEventType.Response) this.keep(upload, event.body);
      },
      error: (error: unknown) => void this.fail(upload, toApiFailure(error)),
    });
    this.sending.set(upload, sending);
  }

  private keep(upload: Upload, body: unknown): void {
    const { photo, duplicate } = uploadPhoto.reply.parse(body);
    upload.photo.set(photo);
    upload.sent.set(1);
    this.settle(upload, duplicate ? 'duplicate' : 'kept');
    this.keptPhotos.next(photo);
  }

  private async fail(upload: Upload, failure: ApiFailure): Promise<void> {
    if (failure.failure.code === 'stale-page') {
      await this.session.load();
      return this.settle(upload, 'waiting');
    }
    if (failure.offline || failure.status === 503) {
      upload.failure.set(failure);
      this.settle(upload, 'interrupted');
      setTimeout(() => this.goOn(), goOnAfterMs);
      return;
    }
    this.refuse(upload, failure);
    this.pump();
  }

  private refuse(upload: Upload, failure: ApiFailure): void {
    upload.failure.set(failure);
    this.settle(upload, 'refused');
  }

  private settle(upload: Upload, state: 'kept' | 'duplicate' | 'interrupted' | 'refused' | 'waiting'): void {
    this.sending.delete(upload);
    upload.state.set(state);
    this.pump();
  }
}

const tooLarge = new ApiFailure(413, {
  code: 'file-too-large',
  message: 'This file is larger than 100 MB.',
  remedy: 'Choose a smaller file.',
  reference: '',
});
