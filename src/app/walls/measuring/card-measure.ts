import { ChangeDetectionStrategy, Component, DestroyRef, type ElementRef, computed, inject, signal, viewChild } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatButtonToggle, MatButtonToggleGroup } from '@angular/material/button-toggle';
import { GeometryError } from '@oriel/shared/projection/geometry-error';
import { A4_LENGTH, ID1_WIDTH, type Lens, lensFromTwoDistances } from '@oriel/shared/viewer/measuring/two-distances';
import { measured } from '@oriel/shared/viewer/measuring/uncertainty';
import { OpenedHeading } from '../../core/opened-heading';
import { FigureField } from '../../figures/figure-field';
import { plainMm } from '../../figures/words';
import { degrees } from '../../screen/screen-measure';
import { worthWords } from '../means/sources';
import { WallKeeper } from '../set-up/wall-keeper';
import { EdgeMarks, type EdgePlaces } from './edge-marks';
import { LiveCamera } from './live-camera';

type Thing = 'card' | 'sheet';

/** A held picture, its marks, and the distance at which the thing was held. */
interface Shot {
  readonly name: string;
  readonly distanceMm: number;
  readonly picture: ImageBitmap | null;
  readonly places: EdgePlaces;
}

/** How well an edge is marked, px, and how askew one holds a card, as a share of its width: five degrees are 0.4 % (practice). */
const markPx = 1;
const askewShare = 0.002;
const holdSeconds = 5;
const sizes = { card: ID1_WIDTH, sheet: A4_LENGTH } as const;

/** The field of view by holding a card at two measured distances before the camera. */
@Component({
  selector: 'oriel-card-measure',
  imports: [MatButton, MatButtonToggle, MatButtonToggleGroup, FigureField, EdgeMarks, OpenedHeading],
  providers: [LiveCamera],
  templateUrl: './card-measure.html',
  styleUrl: './measure.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CardMeasure {
  private readonly keeper = inject(WallKeeper);
  protected readonly live = inject(LiveCamera);
  private readonly video = viewChild<ElementRef<HTMLVideoElement>>('video');
  private timer: ReturnType<typeof setInterval> | undefined;

  protected readonly thing = signal<Thing>('card');
  /** Standard uncertainty of the two distances, mm. */
  protected readonly sureMm = signal(3);
  protected readonly shots = signal<readonly Shot[]>([
    { name: 'Near', distanceMm: 250, picture: null, places: { left: 0, right: 1 } },
    { name: 'Far', distanceMm: 700, picture: null, places: { left: 0, right: 1 } },
  ]);
  /** Which shot is about to be taken, and in how many seconds. */
  protected readonly counting = signal<{ readonly shot: number; readonly seconds: number } | null>(null);

  private readonly found = computed<{ lens: Lens | null; problem: string } | null>(() => {
    const [near, far] = this.shots();
    if (!near.picture || !far.picture) return null;
    const sighting = ({ distanceMm, places }: Shot) => {
      const width = places.right - places.left;
      return { distanceMm: measured(distanceMm, this.sureMm()), widthPx: measured(width, Math.hypot(markPx * Math.SQRT2, askewShare * width)) };
    };
    try {
      return { lens: lensFromTwoDistances(sizes[this.thing()], sighting(near), sighting(far), near.picture.width), problem: '' };
    } catch (cause) {
      if (cause instanceof GeometryError) return { lens: null, problem: cause.message };
      throw cause;
    }
  });
  protected readonly lens = computed(() => this.found()?.lens ?? null);
  protected readonly problem = computed(() => this.found()?.problem ?? '');
  protected readonly words = computed(() => {
    const lens = this.lens();
    if (!lens) return '';
    const { hfovRad, behindFrontMm } = lens;
    return `${plainMm(degrees(hfovRad.value))}° ± ${plainMm(degrees(hfovRad.uncertainty))}° across. The lens lies ${plainMm(behindFrontMm.value, 0)} ± ${plainMm(behindFrontMm.uncertainty, 0)} mm behind the front of the camera. ${worthWords(this.keeper.setUp()!, { hfovRad: hfovRad.uncertainty })}`;
  });

  constructor() {
    inject(DestroyRef).onDestroy(() => {
      clearInterval(this.timer);
      for (const { picture } of this.shots()) picture?.close();
    });
  }

  /** Both hands hold the card, so the picture is held after a while. */
  protected hold(shot: number): void {
    clearInterval(this.timer);
    this.counting.set({ shot, seconds: holdSeconds });
    this.timer = setInterval(() => {
      const seconds = (this.counting()?.seconds ?? 1) - 1;
      if (seconds > 0) return this.counting.set({ shot, seconds });
      clearInterval(this.timer);
      this.counting.set(null);
      void this.take(shot);
    }, 1000);
  }

  protected change(at: number, part: Partial<Shot>): void {
    this.shots.update((shots) => shots.map((shot, i) => (i === at ? { ...shot, ...part } : shot)));
  }

  protected accept({ hfovRad }: Lens): void {
    const { uncertainty } = this.keeper.setUp()!.camera;
    this.keeper.camera({ hfovRad: hfovRad.value, uncertainty: { ...uncertainty, hfovRad: hfovRad.uncertainty } });
    this.live.stop();
  }

  private async take(at: number): Promise<void> {
    const video = this.video()?.nativeElement;
    if (!video?.videoWidth) return;
    const picture = await createImageBitmap(video);
    this.shots()[at].picture?.close();
    this.change(at, { picture, places: { left: picture.width * 0.35, right: picture.width * 0.65 } });
  }
}
