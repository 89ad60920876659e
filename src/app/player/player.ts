import { ChangeDetectionStrategy, Component, DOCUMENT, DestroyRef, ElementRef, computed, effect, inject, input, signal, untracked, viewChild } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Title } from '@angular/platform-browser';
import { Router, RouterLink } from '@angular/router';
import { type SceneDocument, layerImageFile, readScene } from '@oriel/shared/contracts/scenes';
import { GeometryError } from '@oriel/shared/projection/geometry-error';
import { Api, addressOf } from '../core/api';
import { ApiFailure, toApiFailure } from '../core/api-failure';
import { FailureNotice } from '../core/failure-notice';
import { Icon } from '../core/icon/icon';
import { ThisScreen } from '../screen/this-screen';
import { trackingSetUp } from '../screen/tracking-set-up';
import { cameraOutlook } from '../tracking/camera-outlook';
import { FaceTracking } from '../tracking/face-tracking';
import type { TrackingState } from '../tracking/tracking-state';
import { FollowingChoice } from './following-choice';
import { keepAwake } from './keep-awake';
import { type PlayerLine, type PlayerOffer, followingWords, lookingWords, offerWords, playerLine } from './player-words';
import { Playing } from './playing';
import { type Figures, ReadOut } from './read-out';
import { Stillness } from './stillness';
import { wayBack } from './way-back';
import { windowOnScreen } from './window-on-screen';

/** Controls and cursor go when nothing has moved for so long, ms. */
const controlsMs = 3000;
const lineMs = 7000;
const figuresMs = 500;

/** The window itself: a scene drawn for whoever stands before this screen. */
@Component({
  selector: 'oriel-player',
  imports: [MatButton, RouterLink, FailureNotice, Icon, ReadOut],
  providers: [FaceTracking],
  templateUrl: './player.html',
  styleUrl: './player.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '[class.resting]': '!stillness.moved()' },
})
export class Player {
  readonly sceneId = input.required<string>();
  /** `css` or `three` in the query `?draw=`, to compare them; otherwise the graphics processor decides. */
  readonly draw = input<string>();

  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private readonly title = inject(Title);
  private readonly document = inject(DOCUMENT);
  private readonly window = this.document.defaultView!;
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  private readonly picture = viewChild.required<ElementRef<HTMLElement>>('picture');
  private readonly screen = inject(ThisScreen);
  protected readonly tracking = inject(FaceTracking);
  protected readonly following = inject(FollowingChoice);
  protected readonly stillness = new Stillness(controlsMs);
  protected readonly back = wayBack(this.router);
  protected readonly offerWords = offerWords;

  protected readonly scene = signal<SceneDocument | null>(null);
  protected readonly failure = signal<ApiFailure | null>(null);
  protected readonly showing = signal(false);
  protected readonly fullScreen = signal(false);
  protected readonly figures = signal<Figures | null>(null);
  private readonly missing = signal<readonly string[]>([]);
  private readonly byHand = signal(false);
  private readonly privacyTold = signal(false);
  private readonly faded = signal<readonly string[]>([]);

  protected readonly line = computed<PlayerLine | null>(() => {
    if (!this.scene() || !this.showing()) return null;
    return playerLine({
      screenDecided: this.screen.decided(),
      missing: this.missing(),
      following: this.following.on(),
      tracking: this.tracking.state(),
      tooSlow: this.tracking.ladder().lookedBy === 'nothing',
      still: this.following.still,
      privacyTold: this.privacyTold(),
      byHand: this.byHand(),
      userAgent: this.window.navigator.userAgent,
    });
  });
  /** What the switch says: whether a face is followed if it can be, and why it is not where it cannot. */
  protected readonly followingSays = computed(() => {
    const state = this.tracking.state();
    return followingWords(this.following.on(), state === 'off' || state === 'asking' ? (this.outlook() ?? state) : state);
  });
  protected readonly lineSeen = computed(() => {
    const line = this.line();
    return line !== null && !(line.fades && this.faded().includes(line.about));
  });

  /** What is known of the camera before it answers. */
  private readonly outlook = signal<TrackingState | null>(null);
  private playing: Playing | null = null;
  private figuresTimer: ReturnType<typeof setInterval> | undefined;

  constructor() {
    const leaving = new AbortController();
    const awake = keepAwake(this.document);
    void cameraOutlook(this.window.navigator).then((outlook) => this.outlook.set(outlook));
    const unwatch = this.tracking.watch(({ found, eye, capturedMs }) => {
      if (found) this.playing?.face(eye, capturedMs);
      else this.playing?.nobody(capturedMs);
    });
    this.tracking.minds(() => this.playing?.mindedFramesPerSecond() ?? 0);
    inject(DestroyRef).onDestroy(() => {
      leaving.abort();
      awake();
      unwatch();
      clearInterval(this.figuresTimer);
      this.stillness.stop();
      this.playing?.dispose();
      this.playing = null;
      if (this.document.fullscreenElement) void this.document.exitFullscreen();
    });
    this.listen(leaving.signal);
    effect(() => {
      const sceneId = this.sceneId();
      untracked(() => void this.open(sceneId));
    });
    effect(() => this.follow(this.following.on() && this.screen.decided() && this.scene() !== null));
    effect((cleanUp) => this.readLine(this.line(), cleanUp));
  }

  protected async open(sceneId = this.sceneId()): Promise<void> {
    this.failure.set(null);
    try {
      const { scene } = await this.api.call(readScene, { params: { sceneId } });
      this.title.setTitle(`${scene.document.name} · Oriel`);
      this.scene.set(scene.document);
      await this.play(scene.document);
    } catch (error) {
      this.failure.set(error instanceof GeometryError ? impossible(error) : toApiFailure(error));
    }
  }

  protected async accept(offer: PlayerOffer): Promise<void> {
    switch (offer) {
      case 'try-again':
        return this.tracking.start(trackingSetUp(this.screen.setUp()));
      case 'go-without':
        return this.following.choose(false);
      case 'follow':
        return this.following.choose(true);
      case 'as-it-is':
        return this.screen.keep(this.screen.setUp());
      case 'reload':
        return this.playing?.reload();
      case 'set-up':
        await this.router.navigate(['/screen'], { queryParams: { back: this.router.url } });
    }
  }

  protected async toggleFullScreen(): Promise<void> {
    if (this.document.fullscreenElement) await this.document.exitFullscreen();
    else await this.host.requestFullscreen();
  }

  protected toggleFigures(): void {
    clearInterval(this.figuresTimer);
    if (this.figures()) return this.figures.set(null);
    this.readFigures();
    this.figuresTimer = setInterval(() => this.readFigures(), figuresMs);
  }

  protected async leave(): Promise<void> {
    await this.router.navigateByUrl(this.back);
  }

  private async play(scene: SceneDocument): Promise<void> {
    this.playing?.dispose();
    this.playing = new Playing(scene, {
      host: this.picture().nativeElement,
      addressOf: (imageId, edge) => addressOf(layerImageFile, { imageId, edge }),
      area: () => windowOnScreen(this.window, this.screen.setUp().devicePxMm),
      asked: this.draw(),
      still: this.following.still,
      loaded: (missing) => {
        this.missing.set(missing);
        this.showing.set(true);
      },
      handChanged: (byHand) => this.byHand.set(byHand),
    });
    this.playing.faceExpected = this.following.on();
    await this.playing.start();
  }

  private follow(wanted: boolean): void {
    if (this.playing) this.playing.faceExpected = wanted;
    untracked(() => (wanted ? void this.tracking.start(trackingSetUp(this.screen.setUp())) : this.tracking.stop()));
  }

  /** Lets a line that has been read go, and remembers that privacy was spoken of. */
  private readLine(line: PlayerLine | null, cleanUp: (done: () => void) => void): void {
    if (!line?.fades) return;
    const timer = setTimeout(() => {
      this.faded.update((before) => [...before, line.about]);
      if (this.tracking.state() === 'following') this.privacyTold.set(true);
    }, lineMs);
    cleanUp(() => clearTimeout(timer));
  }

  private readFigures(): void {
    const { playing } = this;
    const now = performance.now();
    this.figures.set({
      framesPerSecond: playing?.meter.framesPerSecond(now) ?? 0,
      facesPerSecond: this.tracking.facesPerSecond(),
      captureToDrawnMs: playing?.meter.captureToDrawnMs() ?? null,
      eye: { ...(playing?.eye ?? { x: 0, y: 0, z: 0 }) },
      renderer: playing?.facts?.name ?? null,
      graphicsBytes: playing?.facts?.graphicsBytes ?? null,
      looking: lookingWords(this.tracking.state(), this.tracking.ladder().words),
    });
  }

  /** Outside of templates, so that a moving pointer redraws the picture and not the page. */
  private listen(signal: AbortSignal): void {
    const { host, window } = this;
    host.addEventListener('pointermove', (event) => this.pointed(event), { signal });
    host.addEventListener('pointerdown', (event) => this.pointed(event), { signal });
    this.document.addEventListener('keydown', (event) => this.pressed(event), { signal });
    this.document.addEventListener('fullscreenchange', () => this.fullScreen.set(this.document.fullscreenElement !== null), { signal });
    window.addEventListener('resize', () => this.playing?.resize(), { signal });
  }

  /** The pointer stands in for the face where none is followed; dragging always does, and alone where less motion is asked for. */
  private pointed(event: PointerEvent): void {
    this.stillness.stir();
    const dragged = event.buttons > 0 && this.picture().nativeElement.contains(event.target as Node);
    const alone = this.tracking.state() !== 'following' && !this.following.still;
    if (dragged || (alone && event.type === 'pointermove')) this.playing?.point(event.clientX, event.clientY);
  }

  private pressed(event: KeyboardEvent): void {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    this.stillness.stir();
    if (this.playing?.press(event.key)) return event.preventDefault();
    switch (event.key) {
      case 'f':
        return void this.toggleFullScreen();
      case 'i':
        return this.toggleFigures();
      case 'Escape':
        if (!this.document.fullscreenElement) void this.leave();
    }
  }
}

function impossible(error: GeometryError): ApiFailure {
  return new ApiFailure(-1, { code: 'impossible-scene', message: 'This scene cannot be drawn.', remedy: `${error.message} Correct it in the composer.`, reference: '' });
}
