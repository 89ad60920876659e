import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatButtonToggle, MatButtonToggleGroup } from '@angular/material/button-toggle';
import { MatCheckbox } from '@angular/material/checkbox';
import { WallCamera } from '@oriel/shared/contracts/wall-set-up';
import type { Point3 } from '@oriel/shared/projection/types';
import { acrossFromDiagonal, diagonalFromAcross } from '@oriel/shared/viewer/field-of-view';
import { ABOVE_EDGE_MM } from '@oriel/shared/viewer/usual-camera';
import { FigureField } from '../../figures/figure-field';
import { degrees, radians } from '../../screen/screen-measure';
import { Means } from '../means/means';
import { unmeasured } from '../means/sources';
import { BoardMeasure } from '../measuring/board-measure';
import { CardMeasure } from '../measuring/card-measure';
import { TiltMeasure } from '../measuring/tilt-measure';
import { degreeLimitsOf, limitsOf } from './limits';
import { WallKeeper } from './wall-keeper';

type Side = 'above' | 'below' | 'left' | 'right' | 'anywhere';
const shape = WallCamera.shape;
/** How well a rule finds the middle of a lens behind its cover, mm (practice). */
const ruledMm = 3;

/** The second step: where the camera is, how it is turned, how much it sees. */
@Component({
  selector: 'oriel-wall-camera-step',
  imports: [MatButton, MatButtonToggle, MatButtonToggleGroup, MatCheckbox, FigureField, Means, CardMeasure, BoardMeasure, TiltMeasure],
  templateUrl: './camera-step.html',
  styleUrl: './step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CameraStep {
  protected readonly keeper = inject(WallKeeper);
  protected readonly measuring = signal<'card' | 'board' | 'tilt' | null>(null);
  protected readonly sides: readonly { side: Side; word: string }[] = [
    { side: 'above', word: 'Above' },
    { side: 'below', word: 'Below' },
    { side: 'left', word: 'Left' },
    { side: 'right', word: 'Right' },
    { side: 'anywhere', word: 'Anywhere' },
  ];
  protected readonly place = limitsOf(shape.position.shape.x);
  protected readonly turn = degreeLimitsOf(shape.pitchRad);
  protected readonly field = degreeLimitsOf(shape.hfovRad);
  protected readonly unmeasured = unmeasured;
  protected readonly degrees = degrees;
  protected readonly radians = radians;

  protected readonly camera = computed(() => this.keeper.setUp()!.camera);
  private readonly glass = computed(() => this.keeper.setUp()!.glass);
  /** The middle of which edge the lens stands outside of. */
  protected readonly side = computed<Side>(() => {
    const { x, y } = this.camera().position;
    const { widthMm, heightMm } = this.glass();
    if (x === 0 && Math.abs(y) > heightMm / 2) return y > 0 ? 'above' : 'below';
    if (y === 0 && Math.abs(x) > widthMm / 2) return x > 0 ? 'right' : 'left';
    return 'anywhere';
  });
  protected readonly beyond = computed(() => {
    const { x, y } = this.camera().position;
    const { widthMm, heightMm } = this.glass();
    return Math.max(Math.abs(x) - widthMm / 2, Math.abs(y) - heightMm / 2);
  });
  /** As makers print it, across the diagonal of 16:9. */
  protected readonly diagonal = computed(() => degrees(diagonalFromAcross(this.camera().hfovRad, 16, 9)));

  protected toSide(side: Side, offset = ABOVE_EDGE_MM): void {
    const { widthMm, heightMm } = this.glass();
    const z = this.camera().position.z;
    const at: Readonly<Record<Side, Point3>> = {
      above: { x: 0, y: heightMm / 2 + offset, z },
      below: { x: 0, y: -heightMm / 2 - offset, z },
      left: { x: -widthMm / 2 - offset, y: 0, z },
      right: { x: widthMm / 2 + offset, y: 0, z },
      anywhere: this.camera().position,
    };
    this.keeper.camera({ position: at[side] });
  }

  protected standOff(offset: number): void {
    this.toSide(this.side(), offset);
    this.ruled();
  }

  protected move(part: Partial<Point3>): void {
    this.keeper.camera({ position: { ...this.camera().position, ...part } });
    this.ruled();
  }

  /** A typed turn is no longer the measured one. */
  protected turnTo(part: Partial<Pick<WallCamera, 'pitchRad' | 'yawRad' | 'rollRad'>>): void {
    this.keeper.camera({ ...part, uncertainty: { ...this.camera().uncertainty, pitchRad: null } });
  }

  protected byDiagonal(diagonalDegrees: number): void {
    this.seeAcross(acrossFromDiagonal(radians(diagonalDegrees), 16, 9));
  }

  /** A typed field of view is no longer the measured one. */
  protected seeAcross(hfovRad: number): void {
    this.keeper.camera({ hfovRad, uncertainty: { ...this.camera().uncertainty, hfovRad: null } });
  }

  protected show(which: 'card' | 'board' | 'tilt'): void {
    this.measuring.update((shown) => (shown === which ? null : which));
  }

  /** A place that was typed was read off a rule, unless somebody said how well it is known. */
  private ruled(): void {
    this.keeper.sureness({ positionMm: this.camera().uncertainty.positionMm ?? ruledMm });
  }
}
