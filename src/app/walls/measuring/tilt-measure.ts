import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { GeometryError } from '@oriel/shared/projection/geometry-error';
import type { Point3 } from '@oriel/shared/projection/types';
import { type Tilt, tiltFromSpot } from '@oriel/shared/viewer/measuring/tilt-from-spot';
import { steadyMeanOf } from '@oriel/shared/viewer/measuring/uncertainty';
import { OpenedHeading } from '../../core/opened-heading';
import { plainMm } from '../../figures/words';
import { degrees } from '../../screen/screen-measure';
import { FaceTracking } from '../../tracking/face-tracking';
import { unmeasured, worthWords } from '../means/sources';
import { WallKeeper } from '../set-up/wall-keeper';
import { lensOf } from './lens';
import { MarkedSpot } from './marked-spot';
import { doubtOf } from './spot-doubt';
import { SpotFields } from './spot-fields';
import { Standing } from './standing';
import { StandingView } from './standing-view';
import { TakeResult } from './take-result';

/** One figure stands for both: the less sure one. */
const sureTo = ({ pitchRad, yawRad }: Tilt) => Math.max(pitchRad.uncertainty, yawRad.uncertainty);

/** The camera's pitch and yaw from someone standing at the marked spot. Only with the wall's own camera on this computer. */
@Component({
  selector: 'oriel-tilt-measure',
  imports: [OpenedHeading, SpotFields, StandingView, TakeResult],
  providers: [FaceTracking, Standing],
  templateUrl: './tilt-measure.html',
  styleUrl: './measure.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TiltMeasure {
  private readonly keeper = inject(WallKeeper);
  private readonly spot = inject(MarkedSpot);
  private readonly standing = inject(Standing);
  private readonly readings = signal<readonly Point3[] | null>(null);

  private readonly found = computed<{ tilt: Tilt | null; problem: string } | null>(() => {
    const readings = this.readings();
    if (!readings) return null;
    const lens = lensOf(this.keeper.setUp()!.camera);
    const axis = (of: (point: Point3) => number) => steadyMeanOf(readings.map(of));
    try {
      return { tilt: tiltFromSpot(lens, this.spot.measured(), { x: axis(({ x }) => x), y: axis(({ y }) => y), z: axis(({ z }) => z) }), problem: '' };
    } catch (cause) {
      if (cause instanceof GeometryError) return { tilt: null, problem: cause.message };
      throw cause;
    }
  });
  protected readonly problem = computed(() => this.found()?.problem ?? '');
  protected readonly tilt = computed(() => this.found()?.tilt ?? null);
  protected readonly words = computed(() => {
    const tilt = this.tilt();
    if (!tilt) return '';
    const said = (rad: number, positive: string, negative: string) => `${plainMm(Math.abs(degrees(rad)))}° ${rad >= 0 ? positive : negative}`;
    const { pitchRad, yawRad } = tilt;
    return `Turned ${said(pitchRad.value, 'up', 'down')} (±${plainMm(degrees(pitchRad.uncertainty), 2)}°) and ${said(yawRad.value, 'to the right', 'to the left')} (±${plainMm(degrees(yawRad.uncertainty), 2)}°). ${worthWords(this.keeper.setUp()!, { tiltRad: sureTo(tilt) })}`;
  });

  protected readonly doubt = computed(() => {
    const [tilt, readings] = [this.tilt(), this.readings()];
    if (!tilt || !readings) return '';
    const stands = this.keeper.setUp()!.camera.uncertainty.pitchRad ?? unmeasured.tiltRad;
    return doubtOf(readings, sureTo(tilt), stands, `±${plainMm(degrees(stands), 2)}°`);
  });

  protected async measure(): Promise<void> {
    const { camera, tuning } = this.keeper.setUp()!;
    const untilted = { position: { x: 0, y: 0, z: 0 }, pitchRad: 0, yawRad: 0, rollRad: camera.rollRad, hfovRad: camera.hfovRad, mirrored: camera.mirrored };
    this.readings.set(null);
    this.readings.set(await this.standing.read({ camera: untilted, viewer: { eyeDistanceMm: tuning.ipdMm.value, distanceFactor: tuning.scaleFactor } }));
  }

  protected take(): void {
    const tilt = this.tilt();
    if (!tilt) return;
    const { uncertainty } = this.keeper.setUp()!.camera;
    this.keeper.camera({
      pitchRad: tilt.pitchRad.value,
      yawRad: tilt.yawRad.value,
      uncertainty: { ...uncertainty, pitchRad: sureTo(tilt) },
    });
    this.readings.set(null);
  }
}
