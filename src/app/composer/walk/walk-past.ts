import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatTooltip } from '@angular/material/tooltip';
import { Icon } from '../../core/icon/icon';
import { describeEye } from '../../figures/words';
import { Viewer } from './viewer';

/** Below the drawing: where the simulated viewer is on the path, and the way back to the home eye. */
@Component({
  selector: 'oriel-walk-past',
  imports: [MatButton, MatIconButton, MatTooltip, Icon],
  template: `
    @if (viewer.walking()) {
      <button
        matIconButton
        type="button"
        [attr.aria-label]="viewer.playing() ? 'Pause the walk' : 'Go on walking'"
        matTooltipTouchGestures="off"
        [matTooltip]="viewer.playing() ? 'Pause the walk' : 'Go on walking'"
        (click)="viewer.playing() ? viewer.pause() : viewer.play()"
      >
        <oriel-icon [name]="viewer.playing() ? 'pause' : 'play'" />
      </button>
      <input
        #slider
        type="range"
        min="0"
        max="1"
        step="0.002"
        aria-label="Place on the walk past"
        [attr.aria-valuetext]="where()"
        [value]="viewer.turn()"
        (input)="viewer.moveTo(slider.valueAsNumber)"
      />
    }
    @if (!viewer.atHome()) {
      <button matButton="outlined" type="button" class="home" (click)="viewer.goHome()">Back to the home eye</button>
    }
  `,
  styles: `
    :host { display: flex; align-items: center; gap: 8px; min-width: 0; }
    input { flex: 0 1 220px; min-width: 60px; height: 36px; margin: 0; appearance: none; background: linear-gradient(var(--line), var(--line)) center / 100% 1px no-repeat; cursor: pointer; }
    input::-webkit-slider-thumb { appearance: none; width: 16px; height: 16px; border-radius: 50%; background: var(--sheet); border: 2px solid var(--brass-line); }
    input::-moz-range-thumb { width: 12px; height: 12px; border-radius: 50%; background: var(--sheet); border: 2px solid var(--brass-line); }
    .home { flex: none; white-space: nowrap; }
    @media (max-width: 760px) { input { flex-basis: 100px; flex-grow: 1; } }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WalkPast {
  protected readonly viewer = inject(Viewer);
  protected readonly where = computed(() => describeEye(this.viewer.eye()));
}
