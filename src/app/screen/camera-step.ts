import { ChangeDetectionStrategy, Component, computed, model } from '@angular/core';
import { MatButtonToggle, MatButtonToggleGroup } from '@angular/material/button-toggle';
import { MatCheckbox } from '@angular/material/checkbox';
import { acrossFromDiagonal } from '@oriel/shared/viewer/field-of-view';
import { CameraDrawing } from './camera-drawing';
import { NumberField } from './number-field';
import { degrees, radians } from './screen-measure';
import { type CameraSetUp, type CameraSide, ScreenSetUp } from './screen-set-up';

const rules = ScreenSetUp.shape.camera.shape;
const sides: readonly { side: CameraSide; word: string }[] = [
  { side: 'above', word: 'Above' },
  { side: 'below', word: 'Below' },
  { side: 'left', word: 'Left' },
  { side: 'right', word: 'Right' },
];
/** As makers print them, across the diagonal of 16:9; 0 stands for the usual field, 60 across. */
const printed = [0, 78, 90] as const;

/** The second step: where the camera is and how much it sees. */
@Component({
  selector: 'oriel-camera-step',
  imports: [MatButtonToggle, MatButtonToggleGroup, MatCheckbox, CameraDrawing, NumberField],
  templateUrl: './camera-step.html',
  styleUrl: './camera-step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CameraStep {
  readonly setUp = model.required<ScreenSetUp>();

  protected readonly rules = rules;
  protected readonly sides = sides;
  protected readonly camera = computed(() => this.setUp().camera);
  protected readonly fields = printed.map((diagonal) => ({
    word: diagonal ? `${diagonal}° diagonal` : 'Usual, 60°',
    across: diagonal ? Number(degrees(acrossFromDiagonal(radians(diagonal), 16, 9)).toFixed(1)) : 60,
  }));

  protected change(part: Partial<CameraSetUp>): void {
    this.setUp.update((before) => ({ ...before, camera: { ...before.camera, ...part } }));
  }
}
