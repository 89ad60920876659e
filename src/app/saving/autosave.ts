import { computed, signal } from '@angular/core';
import { type ApiFailure, toApiFailure } from '../core/api-failure';
import type { Draft } from './draft';

/** Someone else's save that came first. */
export interface MovedOn {
  readonly revision: number;
  readonly savedBy: string;
  /** The account that saved, where that is told. */
  readonly savedById?: string | null;
  readonly savedAt: string;
}

/** A document as the server has it. */
export interface Stored<T> extends MovedOn {
  readonly document: T;
}

/** Where a document stands with the server. */
export type SaveState =
  | { readonly kind: 'saved' }
  | { readonly kind: 'waiting' }
  | { readonly kind: 'saving' }
  | { readonly kind: 'offline' }
  | { readonly kind: 'failed'; readonly failure: ApiFailure; readonly retrying: boolean }
  | { readonly kind: 'conflict'; readonly theirs: MovedOn };

/** What autosave asks of the outside. */
export interface Keeping<T> {
  save(revision: number, document: T): Promise<Stored<T>>;
  read(): Promise<Stored<T>>;
  /** Whether two documents are the same in every figure. */
  same(a: T, b: T): boolean;
  /** Puts the unsaved work where a closed tab or a crashed browser cannot lose it. */
  keepDraft(draft: Draft<T>): void;
  dropDraft(): void;
}

const PAUSE_MS = 800;
const FIRST_RETRY_MS = 2000;
const LONGEST_RETRY_MS = 60_000;

/**
 * Saves a document a moment after it changes, always over the revision it was drawn on. What is not yet saved is kept as a
 * draft; a lost network and a failing server are tried again, later and later; a revision that moved on stops it until
 * someone decides.
 */
export class Autosave<T> {
  private readonly current = signal<SaveState>({ kind: 'saved' });
  private readonly base = signal<MovedOn>({ revision: 0, savedAt: '', savedBy: '' });
  private pending: T | null = null;
  private sent: T | null = null;
  private inFlight: Promise<void> | null = null;
  private timer: ReturnType<typeof setTimeout> | undefined;
  private failures = 0;

  readonly state = this.current.asReadonly();
  readonly saved = this.base.asReadonly();
  readonly unsaved = computed(() => this.current().kind !== 'saved');

  /** @param pauseMs how long nothing must have changed before it is saved. */
  constructor(
    private readonly keeping: Keeping<T>,
    private readonly pauseMs = PAUSE_MS,
  ) {}

  /** Starts from the document as the server has it. */
  begin(stored: Stored<T>): void {
    clearTimeout(this.timer);
    this.pending = null;
    this.failures = 0;
    this.adopt(stored);
    this.current.set({ kind: 'saved' });
  }

  changed(document: T): void {
    this.pending = document;
    this.keeping.keepDraft({ revision: this.base().revision, document });
    const state = this.current();
    if (state.kind === 'saved') this.current.set({ kind: 'waiting' });
    const retriesItself = state.kind === 'offline' || (state.kind === 'failed' && state.retrying);
    if (state.kind !== 'conflict' && !retriesItself) this.after(this.pauseMs);
  }

  /** Saves now what is pending; also how a person tries again, and what happens when the network is back. */
  async flush(): Promise<void> {
    clearTimeout(this.timer);
    if (this.inFlight) await this.inFlight;
    if (!this.pending || this.current().kind === 'conflict') return;
    this.inFlight = this.attempt(this.pending).finally(() => (this.inFlight = null));
    await this.inFlight;
  }

  /** Saves mine over theirs, knowingly. */
  async saveOver(): Promise<void> {
    const state = this.current();
    if (state.kind !== 'conflict') return;
    this.base.update((base) => ({ ...base, revision: state.theirs.revision }));
    this.current.set({ kind: 'waiting' });
    await this.flush();
  }

  /** Opens a decision about work left behind that stands on an older revision than the newest, theirs. */
  contest(draft: Draft<T>, theirs: MovedOn): void {
    this.base.update((base) => ({ ...base, revision: draft.revision }));
    this.pending = draft.document;
    this.keeping.keepDraft(draft);
    this.current.set({ kind: 'conflict', theirs });
  }

  /** The unsaved document and the revision it stands on; null when all is saved. */
  unsavedDraft(): Draft<T> | null {
    return this.pending ? { revision: this.base().revision, document: this.pending } : null;
  }

  /** Notes that a farewell carried this document, should its answer never be heard. */
  farewell(): Draft<T> | null {
    const draft = this.current().kind === 'conflict' || this.inFlight ? null : this.unsavedDraft();
    if (draft) this.sent = draft.document;
    return draft;
  }

  stop(): void {
    clearTimeout(this.timer);
  }

  private after(ms: number): void {
    clearTimeout(this.timer);
    this.timer = setTimeout(() => void this.flush(), ms);
  }

  private async attempt(document: T): Promise<void> {
    const sentBefore = this.sent;
    this.sent = document;
    this.current.set({ kind: 'saving' });
    try {
      this.settle(await this.keeping.save(this.base().revision, document), document);
    } catch (error) {
      const failure = toApiFailure(error);
      if (movedOn(failure) && (await this.wasOurOwn([document, sentBefore]))) return;
      this.fail(failure);
    }
  }

  /** A save whose answer was lost on the way makes the next one find its own document there: that is no conflict. */
  private async wasOurOwn(mine: readonly (T | null)[]): Promise<boolean> {
    const theirs = await this.keeping.read().catch(() => null);
    const found = mine.find((document) => document && theirs && this.keeping.same(document, theirs.document));
    if (!found || !theirs) return false;
    this.settle(theirs, found);
    return true;
  }

  private settle(answer: Stored<T>, sent: T): void {
    this.failures = 0;
    this.adopt(answer);
    if (this.pending === sent) {
      this.pending = null;
      this.keeping.dropDraft();
      this.current.set({ kind: 'saved' });
      return;
    }
    if (this.pending) this.keeping.keepDraft({ revision: answer.revision, document: this.pending });
    this.current.set({ kind: 'waiting' });
    this.after(this.pauseMs);
  }

  private fail(failure: ApiFailure): void {
    const moved = movedOn(failure);
    if (moved) return this.current.set({ kind: 'conflict', theirs: moved });
    const retrying = failure.offline || failure.status >= 500 || failure.status === 429;
    this.current.set(failure.offline ? { kind: 'offline' } : { kind: 'failed', failure, retrying });
    if (retrying) this.after(Math.min(FIRST_RETRY_MS * 2 ** this.failures, LONGEST_RETRY_MS));
    this.failures += 1;
  }

  private adopt({ revision, savedAt, savedBy, savedById }: MovedOn): void {
    this.base.set({ revision, savedAt, savedBy, savedById });
  }
}

function movedOn({ failure }: ApiFailure): MovedOn | null {
  const { revision, savedBy, savedById, savedAt } = failure.detail ?? {};
  if (failure.code !== 'revision-moved' || typeof revision !== 'number') return null;
  return { revision, savedBy: String(savedBy), savedById: typeof savedById === 'string' ? savedById : null, savedAt: String(savedAt) };
}
