import { Injectable, computed, inject, signal } from '@angular/core';
import { usualTuning } from '@oriel/shared/contracts/new-wall';
import type { TrackerTuning, WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import { type Wall, listWalls, readWall, saveWall } from '@oriel/shared/contracts/walls';
import type { Glass, ViewingZone } from '@oriel/shared/projection/types';
import { Api } from '../../core/api';
import { toApiFailure } from '../../core/api-failure';
import { Session } from '../../core/session';
import { ThisScreen } from '../../screen/this-screen';
import { trackingSetUp } from '../../screen/tracking-set-up';
import type { TrackingSetUp } from '../../tracking/face-tracking';
import { trackingOn } from '../../wall/wall-tuning';
import { goneBack, tuned } from '../tuning/following-before';

/** What stands on the bench: a wall's set-up and tuning, or those of this screen. */
export interface Subject {
  readonly wallId: string | null;
  readonly name: string;
  readonly glass: Glass;
  readonly zone: ViewingZone | null;
  readonly tracking: TrackingSetUp;
  readonly tuning: TrackerTuning;
}

/** What came of changing a wall's tuning: saved, or somebody saved the wall meanwhile and nothing was written. */
export type Applied =
  | { readonly kind: 'saved'; readonly before: TrackerTuning; readonly after: TrackerTuning }
  | { readonly kind: 'moved'; readonly by: string };

const chosenKey = 'oriel.bench';

/** Which wall the tuner works on, and the one way to change its tuning. */
@Injectable()
export class BenchSubject {
  private readonly api = inject(Api);
  private readonly session = inject(Session);
  private readonly screen = inject(ThisScreen);
  private readonly known = signal<readonly Wall[]>([]);
  private readonly chosenId = signal(localStorage.getItem(chosenKey));

  readonly walls = this.known.asReadonly();
  readonly wall = computed(() => this.known().find(({ id }) => id === this.chosenId()) ?? null);
  readonly subject = computed<Subject>(() => {
    const wall = this.wall();
    return wall ? subjectOf(wall) : this.thisScreen();
  });

  async load(): Promise<void> {
    this.known.set((await this.api.call(listWalls, { params: { householdId: this.session.householdId() } })).walls);
  }

  /** A wall, or this screen where null. */
  choose(wallId: string | null): void {
    if (wallId === null) localStorage.removeItem(chosenKey);
    else localStorage.setItem(chosenKey, wallId);
    this.chosenId.set(wallId);
  }

  /**
   * Changes a wall's tuning over the revision this page knows, and keeps with the wall how it followed before. Where somebody saved the
   * wall meanwhile nothing is written, the newest is fetched, and applying once more changes that. @throws ApiFailure for anything else.
   */
  apply(wallId: string, change: (tuning: TrackerTuning) => TrackerTuning): Promise<Applied> {
    return this.save(wallId, (setUp) => tuned(setUp, change));
  }

  /** Has a wall follow as it did before the bench last changed that; as `apply` does. */
  goBack(wallId: string): Promise<Applied> {
    return this.save(wallId, goneBack);
  }

  private async save(wallId: string, change: (setUp: WallSetUp) => WallSetUp): Promise<Applied> {
    const wall = this.known().find(({ id }) => id === wallId);
    if (!wall) throw new Error(`No wall ${wallId} on the bench.`);
    const after = change(wall.setUp);
    try {
      const body = { revision: wall.revision, setUp: after };
      this.replace((await this.api.call(saveWall, { params: { wallId }, body })).wall);
      return { kind: 'saved', before: wall.setUp.tuning, after: after.tuning };
    } catch (error) {
      const failure = toApiFailure(error);
      if (failure.failure.code !== 'revision-moved') throw failure;
      const { wall: newest } = await this.api.call(readWall, { params: { wallId } });
      this.replace(newest);
      return { kind: 'moved', by: newest.savedBy };
    }
  }

  private replace(wall: Wall): void {
    this.known.update((walls) => walls.map((own) => (own.id === wall.id ? wall : own)));
  }

  private thisScreen(): Subject {
    const setUp = this.screen.setUp();
    return {
      wallId: null,
      name: 'This screen',
      glass: setUp.glass,
      zone: null,
      tracking: trackingSetUp(setUp),
      tuning: usualTuning,
    };
  }
}

function subjectOf({ id, setUp }: Wall): Subject {
  const { name, glass, zone, tuning } = setUp;
  return {
    wallId: id,
    name,
    glass,
    zone,
    tuning,
    tracking: trackingOn(setUp),
  };
}
