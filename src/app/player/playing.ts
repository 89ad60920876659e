import type { SceneDocument } from '@oriel/shared/contracts/scenes';
import type { ViewingZone } from '@oriel/shared/projection/types';
import { createDrawingRate } from '@oriel/shared/ladder/drawing-rate';
import { Pace } from '@oriel/shared/ladder/pace';
import { graphicsName, makeRenderer, rendererFor } from './choose-renderer';
import { IntervalJudge } from './interval-judge';
import { Meter } from './meter';
import type { PictureAddress, Renderer, RendererFacts, RendererName } from './renderer';
import { type SceneOnScreen, sceneOnScreen } from './scene-on-screen';
import { type Following, Viewpoint } from './viewpoint';
import type { WindowOnScreen } from './window-on-screen';

/** What a playing scene stands in. */
export interface PlayingSurroundings {
  readonly host: HTMLElement;
  readonly addressOf: PictureAddress;
  /** The area to fill, measured anew at every resize. */
  readonly area: () => WindowOnScreen;
  /** `css` or `three` from the query; anything else chooses by the graphics processor. */
  readonly asked: string | undefined;
  /** The viewing zone of this room, where it was measured: the scene is drawn for eyes there too, if it is clear from there. */
  readonly zone?: ViewingZone;
  readonly following?: Following;
  /** Whether less motion is asked for. */
  readonly still: boolean;
  /** Called whenever pictures have come, with the names of the layers that have none. */
  readonly loaded: (missing: readonly string[]) => void;
  /** Called when pointer or keys take the eye, and when they give it back. */
  readonly handChanged: (byHand: boolean) => void;
}

const secondMs = 1000;
const refreshMs = 1000 / 60;

/** A scene being played: it owns the renderer and the frame loop, and ends both. */
export class Playing {
  readonly meter = new Meter();
  /** The eye the last frame was drawn for, mm from the centre of the stage. */
  readonly eye = { x: 0, y: 0, z: 1 };
  /** Whether a face is looked for, so that the hand gives way to it. */
  faceExpected = false;
  private readonly window: Window;
  private scene: SceneOnScreen;
  private viewpoint: Viewpoint;
  private renderer: Renderer | null = null;
  private judge: IntervalJudge | null = null;
  private readonly rate = createDrawingRate();
  private readonly pace = new Pace();
  private secondBegunMs = NaN;
  private waking: ReturnType<typeof setTimeout> | undefined;
  private frame = 0;
  private capturedMs = NaN;
  private byHand = false;
  private over = false;

  /** @throws GeometryError where the scene's figures are impossible. */
  constructor(
    private readonly document: SceneDocument,
    private readonly surroundings: PlayingSurroundings,
  ) {
    this.window = surroundings.host.ownerDocument.defaultView!;
    this.scene = sceneOnScreen(document, surroundings.area(), surroundings.zone);
    this.viewpoint = new Viewpoint(this.scene, surroundings.still, surroundings.following);
    Object.assign(this.eye, this.scene.homeEye);
  }

  get facts(): RendererFacts | null {
    return this.renderer?.facts ?? null;
  }

  /** Frames drawn a second, as tracking is to mind them: where fewer are drawn on purpose, as a share of these, of 30. */
  mindedFramesPerSecond(): number {
    return (this.meter.framesPerSecond(performance.now()) * 30) / Math.min(30, this.rate.mostPerS);
  }

  /** Loads the pictures and starts drawing. */
  async start(): Promise<void> {
    const { asked, host } = this.surroundings;
    const name = rendererFor(asked, asked ? null : graphicsName(host.ownerDocument));
    await this.drawWith(name);
    if (name === 'three' && !asked) this.judge = new IntervalJudge();
  }

  /** Loads again what did not come. */
  async reload(): Promise<void> {
    if (!this.renderer) return;
    const { missing } = await this.renderer.load(this.scene);
    if (!this.over) this.surroundings.loaded(missing);
  }

  /** Takes an eye seen by the camera, mm from the centre of the screen. */
  face(eye: { x: number; y: number; z: number }, capturedMs: number): void {
    this.viewpoint.face(eye, capturedMs);
    this.capturedMs = capturedMs;
  }

  nobody(tMs: number): void {
    this.viewpoint.nobody(tMs);
    this.capturedMs = NaN;
  }

  /** Steers by the pointer's place over the window, px. */
  point(xPx: number, yPx: number): void {
    const { widthPx, heightPx } = this.surroundings.area();
    this.viewpoint.point(xPx / widthPx, yPx / heightPx, performance.now());
  }

  /** Steers by a key; says whether it means anything. */
  press(key: string): boolean {
    return this.viewpoint.press(key, performance.now());
  }

  /** Fits the scene to an area that has changed. */
  resize(): void {
    this.scene = sceneOnScreen(this.document, this.surroundings.area(), this.surroundings.zone);
    this.viewpoint = new Viewpoint(this.scene, this.surroundings.still, this.surroundings.following);
    this.renderer?.resize(this.scene);
  }

  dispose(): void {
    this.over = true;
    clearTimeout(this.waking);
    this.window.cancelAnimationFrame(this.frame);
    this.renderer?.dispose();
    this.renderer = null;
  }

  /** The renderer before goes on until the new one has its pictures. */
  private async drawWith(name: RendererName): Promise<void> {
    const { host, addressOf, loaded } = this.surroundings;
    const renderer = await makeRenderer(name, host, addressOf, () => void this.drawWith('css'));
    if (this.over) return renderer.dispose();
    const before = this.renderer;
    this.renderer ??= renderer;
    const { missing } = await renderer.load(this.scene);
    if (this.over) return renderer.dispose();
    this.renderer = renderer;
    before?.dispose();
    renderer.resize(this.scene);
    loaded(missing);
    this.frame ||= this.window.requestAnimationFrame(this.drawFrame);
  }

  private readonly drawFrame = (tMs: number): void => {
    this.frame = this.window.requestAnimationFrame(this.drawFrame);
    if (!this.pace.due(tMs, this.rate.mostPerS)) return;
    this.rest();
    this.viewpoint.at(tMs, this.faceExpected, this.eye);
    if (this.byHand !== this.viewpoint.byHand) this.surroundings.handChanged((this.byHand = this.viewpoint.byHand));
    this.renderer?.draw(this.eye);
    this.meter.frame(tMs);
    if (!Number.isNaN(this.capturedMs)) this.meter.drawn(this.capturedMs, performance.now());
    this.judgeRate(tMs);
    if (this.judge?.frame(tMs)) {
      this.judge = null;
      void this.drawWith('css');
    }
  };

  /** Where fewer frames are drawn than the screen shows, the refreshes in between do not even wake the page. */
  private rest(): void {
    const restMs = 1000 / this.rate.mostPerS - refreshMs;
    if (restMs <= 0) return;
    this.window.cancelAnimationFrame(this.frame);
    this.waking = setTimeout(() => (this.frame = this.window.requestAnimationFrame(this.drawFrame)), restMs);
  }

  /** Second by second; one in which the page was hidden, and so not drawn, tells nothing. */
  private judgeRate(tMs: number): void {
    const sinceMs = tMs - this.secondBegunMs;
    if (sinceMs < secondMs) return;
    this.secondBegunMs = tMs;
    const change = sinceMs < 2 * secondMs ? this.rate.second(tMs, this.meter.framesPerSecond(tMs)) : null;
    if (change) performance.mark('oriel drawing', { detail: change });
  }
}
