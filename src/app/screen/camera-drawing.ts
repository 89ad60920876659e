import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { upFromAcross } from '@oriel/shared/viewer/field-of-view';
import type { Point3 } from '@oriel/shared/projection/types';
import { radians } from './screen-measure';
import { type ScreenSetUp, cameraPosition } from './screen-set-up';

/** Cameras are taken to deliver 16:9; only the drawing of the section depends on it. */
const shape = { width: 16, height: 9 };

/** Two rays of the field of view from a lens, as a closed figure `reach` long, about an axis turned by `turn`. */
function cone(x: number, y: number, axisRad: number, half: number, reach: number): string {
  const end = (angle: number) => `${x + reach * Math.sin(angle)},${y + reach * Math.cos(angle)}`;
  return `M${end(axisRad - half)} L${x},${y} L${end(axisRad + half)}`;
}

/** Screen and camera to scale: the plan from above, the section from the side, and the eye in both where one is seen. */
@Component({
  selector: 'oriel-camera-drawing',
  templateUrl: './camera-drawing.html',
  styleUrl: '../drawing/views.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CameraDrawing {
  readonly setUp = input.required<ScreenSetUp>();
  readonly eye = input<Point3 | null>(null);

  private readonly lens = computed(() => cameraPosition(this.setUp()));
  /** How far into the room the drawing reaches, mm. */
  private readonly reach = computed(() => Math.max(900, 1.6 * this.setUp().glass.widthMm, 1.15 * (this.eye()?.z ?? 0)));
  private readonly halfAcross = computed(() => radians(this.setUp().camera.fieldDegrees) / 2);

  /** x to the viewer's right, y into the room, mm. */
  protected readonly plan = computed(() => {
    const { glass } = this.setUp();
    const { x } = this.lens();
    const half = Math.max(0.62 * this.reach(), glass.widthMm / 2 + 40);
    return {
      box: `${-half} ${-0.12 * this.reach()} ${2 * half} ${1.14 * this.reach()}`,
      left: -glass.widthMm / 2,
      right: glass.widthMm / 2,
      lens: x,
      cone: cone(x, 0, 0, this.halfAcross(), this.reach()),
      unit: this.reach() / 100,
    };
  });

  /** x into the room, y down, mm. */
  protected readonly section = computed(() => {
    const { glass, camera } = this.setUp();
    const { y } = this.lens();
    const halfUp = upFromAcross(2 * this.halfAcross(), shape.width, shape.height) / 2;
    const half = Math.max(0.57 * this.reach(), glass.heightMm / 2 + 40);
    return {
      box: `${-0.12 * this.reach()} ${-half} ${1.14 * this.reach()} ${2 * half}`,
      top: -glass.heightMm / 2,
      bottom: glass.heightMm / 2,
      lens: -y,
      cone: cone(0, -y, Math.PI / 2 - radians(camera.downDegrees), halfUp, this.reach()),
      unit: this.reach() / 100,
    };
  });
}
