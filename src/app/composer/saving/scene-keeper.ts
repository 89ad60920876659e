import { HttpClient } from '@angular/common/http';
import { DOCUMENT, DestroyRef, Injectable, computed, effect, inject, signal, untracked } from '@angular/core';
import { SceneDocument, duplicateScene, readScene, saveScene, type Scene } from '@oriel/shared/contracts/scenes';
import { designers } from '@oriel/shared/contracts/role';
import { Api, addressOf } from '../../core/api';
import { type ApiFailure, toApiFailure } from '../../core/api-failure';
import { Session } from '../../core/session';
import { SceneStore } from '../scene-store';
import { Autosave } from '../../saving/autosave';
import { type Draft, sameBy } from '../../saving/draft';
import { DraftShelf } from '../../saving/draft-shelf';

/** A request may outlive its page only while its body is small: 64 KiB in all (Fetch standard, keepalive). */
const FAREWELL_MAX_BYTES = 60_000;

const sameDocument = sameBy(SceneDocument);

/** Opens one scene from the server and keeps it saved for as long as the page lives. */
@Injectable()
export class SceneKeeper {
  private readonly api = inject(Api);
  private readonly http = inject(HttpClient);
  private readonly session = inject(Session);
  private readonly store = inject(SceneStore);
  private readonly window = inject(DOCUMENT).defaultView;
  private shelf: DraftShelf<SceneDocument> | null = null;
  private opened: SceneDocument | null = null;

  readonly scene = signal<Scene | null>(null);
  readonly failure = signal<ApiFailure | null>(null);
  /** When the work on the sheet was taken up from a page that closed too soon. */
  readonly restored = signal(false);
  /** Whether this browser refuses to hold a draft; then unsaved work is only on this page. */
  readonly draftUnsafe = signal(false);
  readonly autosave = new Autosave<SceneDocument>({
    save: async (revision, document) =>
      (await this.api.call(saveScene, { params: this.params(), body: { revision, document } })).scene,
    read: async () => (await this.api.call(readScene, { params: this.params() })).scene,
    same: sameDocument,
    keepDraft: (draft) => this.draftUnsafe.set(!this.shelf?.keep(draft)),
    dropDraft: () => this.shelf?.drop(),
  });
  readonly mayDesign = computed(() => {
    const household = this.scene()?.householdId;
    const membership = this.session.account()?.memberships.find(({ householdId }) => householdId === household);
    return membership !== undefined && designers.includes(membership.role);
  });

  constructor() {
    effect(() => {
      const document = this.store.document();
      if (!this.store.gesturing()) untracked(() => this.noteChange(document));
    });
    const listeners = new AbortController();
    const { signal: until } = listeners;
    this.window?.addEventListener('online', () => void this.autosave.flush(), { signal: until });
    this.window?.addEventListener('pagehide', () => this.sayFarewell(), { signal: until });
    inject(DestroyRef).onDestroy(() => {
      listeners.abort();
      this.noteChange(this.store.document());
      void this.autosave.flush().finally(() => {
        this.autosave.stop();
        this.shelf?.close();
      });
    });
  }

  async open(sceneId: string): Promise<void> {
    this.failure.set(null);
    // The answer to a save of the scene before must not be taken for one of this.
    await this.autosave.flush();
    try {
      const { scene } = await this.api.call(readScene, { params: { sceneId } });
      this.show(scene);
      if (this.mayDesign()) await this.takeUpDraft(scene);
    } catch (error) {
      this.failure.set(toApiFailure(error));
    }
  }

  /** Leaves my changes for theirs; one undo brings mine back. */
  async takeTheirs(): Promise<void> {
    const { scene } = await this.api.call(readScene, { params: this.params() });
    this.shelf?.drop();
    this.scene.set(scene);
    this.autosave.begin(scene);
    this.opened = scene.document;
    this.store.edit(() => scene.document);
  }

  /** Keeps my changes as a scene of their own and answers its id. */
  async keepAsCopy(): Promise<string> {
    const { scene } = await this.api.call(duplicateScene, {
      params: this.params(),
      body: { document: this.store.document() },
    });
    this.shelf?.drop();
    this.opened = this.store.document();
    this.autosave.stop();
    return scene.id;
  }

  private show(scene: Scene): void {
    this.opened = scene.document;
    this.restored.set(false);
    this.scene.set(scene);
    this.store.open(scene.document);
    this.store.readOnly.set(!this.mayDesign());
    this.autosave.begin(scene);
  }

  private async takeUpDraft(scene: Scene): Promise<void> {
    const accountId = this.session.account()?.id ?? '';
    this.shelf?.close();
    this.shelf = new DraftShelf(SceneDocument, accountId, scene.id, localStorage, navigator.locks);
    const draft = await this.shelf.takeLeftBehind();
    if (!draft) return;
    if (sameDocument(draft.document, scene.document)) return this.shelf.drop();
    if (draft.revision !== scene.revision) this.opened = draft.document;
    this.store.edit(() => draft.document);
    this.restored.set(true);
    if (draft.revision !== scene.revision) this.autosave.contest(draft, scene);
  }

  private noteChange(document: SceneDocument): void {
    if (!this.opened || document === this.opened || this.store.readOnly()) return;
    this.opened = document;
    this.autosave.changed(document);
  }

  /** The last save of a closing page. Its answer is never heard, so the draft stays; opening again finds the two equal. */
  private sayFarewell(): void {
    this.noteChange(this.store.document());
    const draft = this.autosave.farewell();
    const scene = this.scene();
    if (!draft || !scene || sizeOf(draft) > FAREWELL_MAX_BYTES) return;
    this.http
      .request(saveScene.method, addressOf(saveScene, this.params()), { body: draft, keepalive: true })
      .subscribe({ error: () => undefined });
  }

  private params(): { sceneId: string } {
    return { sceneId: this.scene()?.id ?? '' };
  }
}

const sizeOf = (draft: Draft<SceneDocument>) => new Blob([JSON.stringify(draft)]).size;
