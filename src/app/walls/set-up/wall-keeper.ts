import { HttpClient } from '@angular/common/http';
import { DOCUMENT, DestroyRef, Injectable, computed, inject, signal } from '@angular/core';
import { tuners } from '@oriel/shared/contracts/role';
import { pairWall, unpairWall } from '@oriel/shared/contracts/wall-pairing';
import { type TrackerTuning, type WallCamera, type WallGlass, WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import { type Wall, readWall, removeWall, saveWall } from '@oriel/shared/contracts/walls';
import type { ViewingZone } from '@oriel/shared/projection/types';
import { Api, addressOf } from '../../core/api';
import { type ApiFailure, toApiFailure } from '../../core/api-failure';
import { Session } from '../../core/session';
import { Autosave, type Stored } from '../../saving/autosave';
import { sameBy } from '../../saving/draft';
import { DraftShelf } from '../../saving/draft-shelf';
import { cameraOnFrame } from './camera-on-frame';

const lookMs = 10_000;
/** What is typed here is to be on the wall within a second; a side that is dragged is saved when it rests. */
const pauseMs = 250;
const asStored = (wall: Wall): Stored<WallSetUp> => ({ revision: wall.revision, savedAt: wall.savedAt, savedBy: wall.savedBy, document: wall.setUp });

/** One wall while its set-up is open: every change is saved by itself, and what its screen reports is asked for again and again. */
@Injectable()
export class WallKeeper {
  private readonly api = inject(Api);
  private readonly http = inject(HttpClient);
  private readonly session = inject(Session);
  private readonly window = inject(DOCUMENT).defaultView;
  private shelf: DraftShelf<WallSetUp> | null = null;

  /** The wall as the server last told of it; its set-up may be older than what is typed here. */
  readonly wall = signal<Wall | null>(null);
  /** The set-up as it stands on this page. */
  readonly setUp = signal<WallSetUp | null>(null);
  readonly failure = signal<ApiFailure | null>(null);
  /** Whether work left behind by a page that closed too soon was taken up. */
  readonly restored = signal(false);
  /** What keeps the set-up from being saved, by the field it speaks of, e.g. `zone.rightMm`. */
  readonly problems = computed<Readonly<Record<string, string>>>(() => {
    const setUp = this.setUp();
    const issues = setUp ? (WallSetUp.safeParse(setUp).error?.issues ?? []) : [];
    return Object.fromEntries(issues.map(({ path, message }) => [path.join('.'), message]));
  });
  readonly mayTune = computed(() => {
    const householdId = this.wall()?.householdId;
    const membership = this.session.account()?.memberships.find((one) => one.householdId === householdId);
    return membership !== undefined && tuners.includes(membership.role);
  });
  readonly autosave = new Autosave<WallSetUp>(
    {
      save: async (revision, setUp) => asStored(this.hear((await this.api.call(saveWall, { params: this.params(), body: { revision, setUp } })).wall)),
      read: async () => asStored(this.hear((await this.api.call(readWall, { params: this.params() })).wall)),
      same: sameBy(WallSetUp),
      keepDraft: (draft) => void this.shelf?.keep(draft),
      dropDraft: () => this.shelf?.drop(),
    },
    pauseMs,
  );

  constructor() {
    const listeners = new AbortController();
    this.window?.addEventListener('online', () => void this.autosave.flush(), { signal: listeners.signal });
    this.window?.addEventListener('pagehide', () => this.sayFarewell(), { signal: listeners.signal });
    const looking = setInterval(() => void this.look(), lookMs);
    inject(DestroyRef).onDestroy(() => {
      listeners.abort();
      clearInterval(looking);
      void this.autosave.flush().finally(() => {
        this.autosave.stop();
        this.shelf?.close();
      });
    });
  }

  async open(wallId: string): Promise<void> {
    this.failure.set(null);
    try {
      this.adopt((await this.api.call(readWall, { params: { wallId } })).wall);
      if (this.mayTune()) await this.takeUpDraft();
    } catch (error) {
      this.failure.set(toApiFailure(error));
    }
  }

  edit(change: (before: WallSetUp) => WallSetUp): void {
    const before = this.setUp();
    if (!before || !this.mayTune()) return;
    const after = change(before);
    this.setUp.set(after);
    if (WallSetUp.safeParse(after).success) this.autosave.changed(after);
  }

  /** Another glass; a camera on its frame goes with the edge it stands at. */
  glass(part: Partial<WallGlass>): void {
    this.edit((before) => {
      const glass = { ...before.glass, ...part };
      return { ...before, glass, camera: { ...before.camera, position: cameraOnFrame(before.camera.position, before.glass, glass) } };
    });
  }

  camera(part: Partial<WallCamera>): void {
    this.edit((before) => ({ ...before, camera: { ...before.camera, ...part } }));
  }

  /** How sure figures of the camera are; null for what is no longer as it was measured. */
  sureness(part: Partial<WallCamera['uncertainty']>): void {
    this.edit((before) => ({ ...before, camera: { ...before.camera, uncertainty: { ...before.camera.uncertainty, ...part } } }));
  }

  zone(part: Partial<ViewingZone>): void {
    this.edit((before) => ({ ...before, zone: { ...before.zone, ...part } }));
  }

  tuning(part: Partial<TrackerTuning>): void {
    this.edit((before) => ({ ...before, tuning: { ...before.tuning, ...part } }));
  }

  /** Asks the server how the wall is; what another saved meanwhile is taken over while nothing here is unsaved. */
  async look(): Promise<void> {
    const known = this.wall();
    if (!known || this.window?.document.hidden) return;
    try {
      const wall = this.hear((await this.api.call(readWall, { params: this.params() })).wall);
      if (wall.revision !== this.autosave.saved().revision && !this.autosave.unsaved()) this.adopt(wall);
    } catch (error) {
      const failure = toApiFailure(error);
      if (failure.status === 404) this.failure.set(failure);
    }
  }

  async pair(code: string): Promise<void> {
    this.hear((await this.api.call(pairWall, { params: this.params(), body: { code } })).wall);
  }

  async unpair(): Promise<void> {
    this.hear((await this.api.call(unpairWall, { params: this.params() })).wall);
  }

  async remove(): Promise<void> {
    await this.api.call(removeWall, { params: this.params() });
    this.autosave.stop();
    this.shelf?.drop();
  }

  /** Leaves my changes for what another saved. */
  async takeTheirs(): Promise<void> {
    const { wall } = await this.api.call(readWall, { params: this.params() });
    this.shelf?.drop();
    this.adopt(wall);
  }

  private adopt(wall: Wall): void {
    this.hear(wall);
    this.setUp.set(wall.setUp);
    this.autosave.begin(asStored(wall));
  }

  private hear(wall: Wall): Wall {
    this.wall.set(wall);
    return wall;
  }

  private async takeUpDraft(): Promise<void> {
    const wall = this.wall()!;
    this.shelf?.close();
    this.shelf = new DraftShelf(WallSetUp, this.session.account()?.id ?? '', wall.id, localStorage, navigator.locks);
    const draft = await this.shelf.takeLeftBehind();
    if (!draft) return;
    if (sameBy(WallSetUp)(draft.document, wall.setUp)) return this.shelf.drop();
    this.setUp.set(draft.document);
    this.restored.set(true);
    if (draft.revision === wall.revision) this.autosave.changed(draft.document);
    else this.autosave.contest(draft, wall);
  }

  /** The last save of a closing page. Its answer is never heard, so the draft stays; opening again finds the two equal. */
  private sayFarewell(): void {
    const draft = this.autosave.farewell();
    if (!draft) return;
    const body = { revision: draft.revision, setUp: draft.document };
    this.http.request(saveWall.method, addressOf(saveWall, this.params()), { body, keepalive: true }).subscribe({ error: () => undefined });
  }

  private params(): { wallId: string } {
    return { wallId: this.wall()?.id ?? '' };
  }
}
