import { ChangeDetectionStrategy, Component, DOCUMENT, DestroyRef, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatProgressBar } from '@angular/material/progress-bar';
import type { MirrorDelay } from '@oriel/shared/mirror/mirror-delay';
import type { TrackerTuning } from '@oriel/shared/contracts/wall-set-up';
import { requestCamera } from '../../tracking/camera-request';
import { CAMERAS } from '../../tracking/tracking-surroundings';
import type { TrackingState } from '../../tracking/tracking-state';
import { eachFrame, playTrack } from '../../tracking/video-frames';
import { trackingWords } from '../../tracking/tracking-words';
import { BenchSubject } from '../subject/bench-subject';
import { PutOnWall } from '../tuning/put-on-wall';
import { Blink } from './blink';
import { Brightness } from './brightness';

/** `captureKnown` whether the browser told when frames were captured, and not only when they came. */
interface Measured extends MirrorDelay {
  readonly captureKnown: boolean;
}

/** Practice. */
const USUAL_MS = { least: 50, most: 120, slow: 200 };

type Step =
  | { readonly kind: 'before' }
  | { readonly kind: 'asking' }
  | { readonly kind: 'without-camera'; readonly why: TrackingState }
  | { readonly kind: 'blinking' }
  | { readonly kind: 'measured'; readonly delay: Measured }
  | { readonly kind: 'not-seen'; readonly correlation: number };

/** With a mirror before the camera the screen measures its own delay, from drawing to capture, and prediction is set by it. */
@Component({
  selector: 'oriel-mirror-page',
  imports: [MatButton, MatProgressBar, PutOnWall],
  templateUrl: './mirror-page.html',
  styleUrl: './mirror-page.scss',
  host: { '(document:keydown.escape)': 'stop()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MirrorPage {
  private readonly cameras = inject(CAMERAS);
  private readonly document = inject(DOCUMENT);
  private readonly window = this.document.defaultView!;
  protected readonly bench = inject(BenchSubject);
  protected readonly step = signal<Step>({ kind: 'before' });
  protected readonly level = signal(0);
  protected readonly share = signal(0);
  protected readonly why = computed(() => {
    const step = this.step();
    return step.kind === 'without-camera' ? trackingWords[step.why] : null;
  });
  protected readonly measured = computed(() => {
    const step = this.step();
    return step.kind === 'measured' ? step.delay : null;
  });
  protected readonly verdict = computed(() => {
    const ms = this.measured()?.delayMs ?? 0;
    if (ms > USUAL_MS.slow) return 'which is slow';
    if (ms > USUAL_MS.most) return 'more than usual';
    return ms < USUAL_MS.least ? 'less than usual' : 'as is usual';
  });
  protected readonly withDelay = computed(() => {
    const displayDelayMs = Math.max(0, Math.round(this.measured()?.delayMs ?? 0));
    return (tuning: TrackerTuning): TrackerTuning => ({ ...tuning, displayDelayMs });
  });
  private end: () => void = () => undefined;
  private attempt = 0;

  constructor() {
    inject(DestroyRef).onDestroy(() => this.release());
  }

  /** Only ever called by a press: nothing blinks unasked. */
  protected async start(): Promise<void> {
    this.release();
    const attempt = this.attempt;
    this.step.set({ kind: 'asking' });
    const answer = await requestCamera(this.cameras);
    const stale = attempt !== this.attempt;
    if (answer.given && stale) answer.stream.getTracks().forEach((track) => track.stop());
    if (stale) return;
    if (!answer.given) return this.step.set({ kind: 'without-camera', why: answer.why });
    this.blink(answer.stream);
  }

  protected stop(): void {
    if (this.step().kind !== 'blinking' && this.step().kind !== 'asking') return;
    this.release();
    this.step.set({ kind: 'before' });
  }

  private blink(stream: MediaStream): void {
    const blink = new Blink();
    const brightness = new Brightness(this.document);
    const video = playTrack(stream.getVideoTracks()[0]);
    let captureKnown = false;
    const endFrames = eachFrame(video, (capturedMs, known) => {
      captureKnown = known;
      const parts = brightness.of(video);
      if (parts) blink.see(capturedMs, parts);
    });
    let frame = 0;
    const draw = () => {
      const nowMs = performance.now();
      const level = blink.levelAt(nowMs);
      if (level !== null) this.level.set(level);
      this.share.set(Math.floor(50 * blink.share(nowMs)) / 50);
      if (blink.over(nowMs)) return this.finish(blink, captureKnown);
      frame = this.window.requestAnimationFrame(draw);
    };
    this.end = () => {
      this.window.cancelAnimationFrame(frame);
      endFrames();
      stream.getTracks().forEach((track) => track.stop());
    };
    this.step.set({ kind: 'blinking' });
    frame = this.window.requestAnimationFrame(draw);
  }

  private finish(blink: Blink, captureKnown: boolean): void {
    this.release();
    const { delay, correlation } = blink.result();
    this.step.set(delay ? { kind: 'measured', delay: { ...delay, captureKnown } } : { kind: 'not-seen', correlation });
  }

  private release(): void {
    this.attempt++;
    this.end();
    this.end = () => undefined;
  }
}
