import { ChangeDetectionStrategy, Component, DOCUMENT, DestroyRef, type ElementRef, computed, effect, inject, input, linkedSignal, signal, untracked, viewChild } from '@angular/core';
import type { Scene } from '@oriel/shared/contracts/scenes';
import { wallImageFile } from '@oriel/shared/contracts/wall-screen';
import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import { addressOf } from '../core/api';
import { lookingWords } from '../player/player-words';
import { type Figures, ReadOut } from '../player/read-out';
import { windowOnScreen } from '../player/window-on-screen';
import { FaceTracking } from '../tracking/face-tracking';
import type { TrackingState } from '../tracking/tracking-state';
import { KeptShowing, type Showing } from './kept-showing';
import { type CameraLack, lackAfter, wallLine } from './wall-line';
import { type WallFacts, WallReporter } from './wall-reporter';
import { WallStage } from './wall-stage';
import { devicePxMmOn, followingOn, trackingOn } from './wall-tuning';

const tickMs = 1000;
/** A tracker from which nothing was heard for so long has hung, and is started anew. */
const hungMs = 20_000;
/** A camera that was refused may have been allowed since. */
const askAgainMs = 60_000;

const same = (a: unknown, b: unknown) => JSON.stringify(a) === JSON.stringify(b);

/** What a wall shows: its scene, by its own glass, camera and tuning. Words only where something needs a person; figures for the key i. */
@Component({
  selector: 'oriel-wall-picture',
  imports: [ReadOut],
  providers: [FaceTracking],
  template: `
    <div #picture class="picture" [attr.role]="scene() ? 'img' : null" [attr.aria-label]="scene() ? scene()!.document.name + ', seen through the glass' : null"></div>
    @if (figures(); as shown) {
      <oriel-read-out [figures]="shown" />
    }
    @if (line(); as words) {
      <p role="status">{{ words }}</p>
    }
  `,
  styles: `
    :host { position: absolute; inset: 0; overflow: hidden; color: var(--ink); }
    .picture { position: absolute; inset: 0; }
    oriel-read-out { position: absolute; right: 24px; top: 24px; max-width: calc(100% - 48px); }
    p { position: absolute; inset: auto 0 4vmin; margin: 0 auto; width: fit-content; max-width: min(46em, 86%); padding: 10px 16px; font-size: clamp(14px, 2vmin, 24px); background: var(--sheet); border: 1px solid var(--line); border-radius: var(--corner); }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(document:keydown.i)': 'toggleFigures()', '(window:resize)': 'stage?.resize()' },
})
export class WallPicture {
  readonly showing = input.required<Showing>();
  /** `css` or `three`, to compare them; otherwise the graphics processor decides. */
  readonly draw = input<string>();

  private readonly window = inject(DOCUMENT).defaultView!;
  private readonly kept = inject(KeptShowing);
  private readonly reporter = inject(WallReporter);
  private readonly tracking = inject(FaceTracking);
  private readonly picture = viewChild.required<ElementRef<HTMLElement>>('picture');

  protected stage: WallStage | null = null;
  protected readonly figures = signal<Figures | null>(null);
  private readonly missing = signal<readonly string[]>([]);
  private readonly nowMs = signal(performance.now());
  private readonly trackingSince = linkedSignal<TrackingState, number>({ source: this.tracking.state, computation: () => performance.now() });
  private readonly lack = linkedSignal<TrackingState, CameraLack | null>({
    source: this.tracking.state,
    computation: (state, previous) => lackAfter(previous?.value ?? null, state, performance.now()),
  });
  private readonly setUp = computed<WallSetUp>(() => this.showing().setUp, { equal: same });
  protected readonly scene = computed<Scene | null>(() => this.showing().scene, { equal: same });
  private readonly played = computed(() => ({ scene: this.scene(), glass: this.setUp().glass, zone: this.setUp().zone, following: followingOn(this.setUp()) }), { equal: same });
  private readonly tracked = computed(() => trackingOn(this.setUp()), { equal: same });

  protected readonly line = computed(() =>
    wallLine({
      wallName: this.setUp().name,
      sceneChosen: this.scene() !== null,
      missing: this.missing(),
      lack: this.lack(),
      nowMs: this.nowMs(),
    }),
  );

  /** Addresses of the pictures that the scene shown was drawn with. */
  private drawnWith = new Set<string>();
  private keptWith = '';
  private heardMs = performance.now();

  constructor() {
    const unwatch = this.tracking.watch(({ found, eye, capturedMs }) => {
      this.heardMs = performance.now();
      if (found) this.stage?.playing?.face(eye, capturedMs);
      else this.stage?.playing?.nobody(capturedMs);
    });
    this.tracking.minds(() => this.stage?.playing?.mindedFramesPerSecond() ?? 0);
    const unreport = this.reporter.start(() => this.facts());
    const tick = setInterval(() => this.tick(), tickMs);
    effect(() => {
      const played = this.played();
      untracked(() => void this.play(played));
    });
    effect(() => {
      const tracked = this.tracked();
      const wanted = this.scene() !== null;
      untracked(() => this.follow(tracked, wanted));
    });
    effect(() => {
      if (this.tracking.ladder().changes.length > 0) untracked(() => this.reporter.collect(this.facts()));
    });
    inject(DestroyRef).onDestroy(() => {
      unwatch();
      unreport();
      clearInterval(tick);
      this.stage?.clear();
    });
  }

  protected toggleFigures(): void {
    this.figures.set(this.figures() ? null : this.read());
  }

  private async play({ scene, glass, zone, following }: ReturnType<typeof this.played>): Promise<void> {
    this.stage ??= new WallStage(this.picture().nativeElement);
    this.missing.set([]);
    if (!scene) return this.stage.clear();
    const drawnWith = (this.drawnWith = new Set<string>());
    await this.stage.play(
      scene.document,
      {
        addressOf: (imageId, edge) => {
          const address = addressOf(wallImageFile, { imageId, edge });
          drawnWith.add(address);
          return address;
        },
        area: () => windowOnScreen(this.window, devicePxMmOn(glass, this.window)),
        asked: this.draw(),
        zone,
        following,
        still: false,
      },
      (missing) => this.missing.set(missing),
    );
  }

  /** A change of figures reaches a running tracker without asking for the camera anew. */
  private follow(tracked: ReturnType<typeof this.tracked>, wanted: boolean): void {
    if (!wanted) return this.tracking.stop();
    if (this.tracking.state() === 'off') void this.tracking.start(tracked);
    else this.tracking.change(tracked);
  }

  private tick(): void {
    const now = performance.now();
    this.nowMs.set(now);
    if (this.figures()) this.figures.set(this.read());
    this.keepPictures();
    const state = this.tracking.state();
    const looks = state === 'following' || state === 'nobody' || state === 'starting';
    const since = Math.max(this.heardMs, this.trackingSince());
    const hung = looks && now - since > hungMs && this.tracking.ladder().lookedBy !== 'nothing';
    if (hung || (state === 'refused' && now - since > askAgainMs)) {
      this.heardMs = now;
      void this.tracking.start(this.tracked());
    }
  }

  /** Once the scene stands sharp, its pictures are kept for a start without a network. */
  private keepPictures(): void {
    if (!this.stage?.playing?.facts?.sharp || this.missing().length > 0) return;
    const all = [...this.drawnWith].sort().join();
    if (all === this.keptWith) return;
    this.keptWith = all;
    void this.kept.keepPictures(this.drawnWith);
  }

  private framesPerSecond(): number {
    return this.stage?.playing?.meter.framesPerSecond(performance.now()) ?? 0;
  }

  private facts(): WallFacts {
    const playing = this.stage?.playing;
    const { step, words } = this.tracking.ladder();
    return {
      framesPerS: this.framesPerSecond(),
      trackedPerS: this.tracking.facesPerSecond(),
      ladderStep: step,
      ladderWords: words,
      renderer: playing?.facts?.name ?? 'none',
      tracking: this.tracking.state(),
      latencyMs: playing?.meter.captureToDrawnMs() ?? null,
    };
  }

  private read(): Figures {
    const { framesPerS, trackedPerS, ladderWords, latencyMs } = this.facts();
    const playing = this.stage?.playing;
    return {
      framesPerSecond: framesPerS,
      facesPerSecond: trackedPerS,
      captureToDrawnMs: latencyMs,
      eye: { ...(playing?.eye ?? { x: 0, y: 0, z: 0 }) },
      renderer: playing?.facts?.name ?? null,
      graphicsBytes: playing?.facts?.graphicsBytes ?? null,
      looking: lookingWords(this.tracking.state(), ladderWords),
    };
  }
}
