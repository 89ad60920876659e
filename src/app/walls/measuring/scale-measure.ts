import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { TrackerTuning } from '@oriel/shared/contracts/wall-set-up';
import type { Point3 } from '@oriel/shared/projection/types';
import { factorFromSpot } from '@oriel/shared/viewer/measuring/scale-from-spot';
import { type Measured, steadyMeanOf } from '@oriel/shared/viewer/measuring/uncertainty';
import { OpenedHeading } from '../../core/opened-heading';
import { plainMm } from '../../figures/words';
import { FaceTracking } from '../../tracking/face-tracking';
import { worthWords } from '../means/sources';
import { limitsOf } from '../set-up/limits';
import { WallKeeper } from '../set-up/wall-keeper';
import { lensOf } from './lens';
import { MarkedSpot } from './marked-spot';
import { doubtOf } from './spot-doubt';
import { SpotFields } from './spot-fields';
import { Standing } from './standing';
import { StandingView } from './standing-view';
import { TakeResult } from './take-result';

const factorLimits = limitsOf(TrackerTuning.shape.scaleFactor);

/** A viewer's own scale from standing at the marked spot. Only with the wall's own camera on this computer. */
@Component({
  selector: 'oriel-scale-measure',
  imports: [OpenedHeading, SpotFields, StandingView, TakeResult],
  providers: [FaceTracking, Standing],
  template: `
    <h2 orielOpenedHeading>A viewer, by standing at a spot</h2>
    <oriel-spot-fields />
    <p class="marginal">Measure the camera first: its field of view counts here as it is. This computer must have the wall’s camera; pictures are looked at on this page only, and not kept.</p>
    <oriel-standing-view (begin)="measure()" />
    @if (factor(); as k) {
      <p class="result figures" role="status">{{ words() }}</p>
      @if (possible()) {
        <oriel-take-result [doubt]="doubt()" (again)="measure()" (take)="take(k)" />
      } @else {
        <p class="problem" role="alert">That is no head’s scale. Check the spot, the field of view and the distance between the eyes.</p>
      }
    }
  `,
  styleUrl: './measure.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScaleMeasure {
  private readonly keeper = inject(WallKeeper);
  private readonly spot = inject(MarkedSpot);
  private readonly standing = inject(Standing);
  /** The eye as it was seen, its ranges from the lens, mm, and with which factor. */
  private readonly seen = signal<{ eyes: readonly Point3[]; ranges: readonly number[]; factor: number } | null>(null);

  protected readonly factor = computed<Measured | null>(() => {
    const seen = this.seen();
    if (!seen) return null;
    const lens = lensOf(this.keeper.setUp()!.camera);
    return factorFromSpot(seen.factor, steadyMeanOf(seen.ranges), lens, this.spot.measured());
  });
  protected readonly possible = computed(() => {
    const value = this.factor()?.value ?? 0;
    return value >= factorLimits.least && value <= factorLimits.most;
  });
  protected readonly words = computed(() => {
    const [k, seen] = [this.factor(), this.seen()];
    if (!k || !seen) return '';
    const percent = 100 * (k.value / seen.factor - 1);
    const off = Number(plainMm(percent)) === 0 ? 'at the right distance' : `${plainMm(Math.abs(percent))} % too ${percent > 0 ? 'far' : 'near'}`;
    const seenWords = `You were seen ${off}.`;
    if (!this.possible()) return seenWords;
    const share = k.uncertainty / k.value;
    return `${seenWords} Taken, distances are right to ±${plainMm(100 * share)} %. ${worthWords(this.keeper.setUp()!, { viewerScale: share })}`;
  });

  protected readonly doubt = computed(() => {
    const [k, seen] = [this.factor(), this.seen()];
    if (!k || !seen) return '';
    const { value, uncertainty } = this.keeper.setUp()!.tuning.ipdMm;
    const stands = uncertainty / value;
    return doubtOf(seen.eyes, k.uncertainty / k.value, stands, `±${plainMm(100 * stands)} %`);
  });

  protected async measure(): Promise<void> {
    const { camera, tuning } = this.keeper.setUp()!;
    const { position } = camera;
    const factor = tuning.scaleFactor;
    this.seen.set(null);
    const eyes = await this.standing.read({ camera, viewer: { eyeDistanceMm: tuning.ipdMm.value, distanceFactor: factor } });
    if (eyes) this.seen.set({ eyes, ranges: eyes.map(({ x, y, z }) => Math.hypot(x - position.x, y - position.y, z - position.z)), factor });
  }

  /** The factor makes up for the distance between the eyes, so that only its own uncertainty is left. */
  protected take({ value, uncertainty }: Measured): void {
    const { ipdMm } = this.keeper.setUp()!.tuning;
    this.keeper.tuning({ scaleFactor: value, ipdMm: { value: ipdMm.value, uncertainty: (ipdMm.value * uncertainty) / value } });
    this.seen.set(null);
  }
}
