import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import { coneOf, roomExtents } from './wall-room';

/** How large it stands on the page of walls, and how large its figures are there, px; on a narrower page they shrink with it. */
const usualPx = { width: 340, height: 264 } as const;
const letterPx = 11.5;

/** A wall from above, to scale: the glass, what its camera sees, the viewing zone. */
@Component({
  selector: 'oriel-small-plan',
  template: `
    @let it = drawn();
    <svg [attr.viewBox]="it.box" role="img" [attr.aria-label]="'Plan of ' + setUp().name + ', from above, to scale'">
      <rect class="zone" [attr.x]="it.zone.x" [attr.y]="it.zone.y" [attr.width]="it.zone.width" [attr.height]="it.zone.height" />
      <path class="cone" [attr.d]="it.cone" />
      @for (metre of it.metres; track metre.at) {
        <line class="reach" [attr.x1]="metre.x" [attr.x2]="metre.x + it.tick" [attr.y1]="metre.at" [attr.y2]="metre.at" />
        <text [attr.x]="metre.x + 1.5 * it.tick" [attr.y]="metre.at + it.letter * 0.35" [attr.font-size]="it.letter">{{ metre.words }}</text>
      }
      <line class="glass" [attr.x1]="-it.half" [attr.x2]="it.half" y1="0" y2="0" />
      <circle class="lens" [attr.cx]="it.lens.x" [attr.cy]="it.lens.z" [attr.r]="it.unit * 1.5" />
    </svg>
  `,
  styles: `
    :host, svg { display: block; width: 100%; height: 100%; overflow: visible; }
    line, path, circle { vector-effect: non-scaling-stroke; fill: none; }
    .zone { fill: var(--zone); }
    .cone { stroke: var(--brass-line); stroke-dasharray: 5 4; }
    .reach { stroke: var(--line); }
    text { font-family: var(--sans); fill: var(--pencil); paint-order: stroke; stroke: var(--sheet); stroke-width: 4px; stroke-linejoin: round; vector-effect: non-scaling-stroke; }
    .glass { stroke: var(--ink); stroke-width: 3.4px; }
    .lens { fill: var(--ink); }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SmallPlan {
  readonly setUp = input.required<WallSetUp>();

  /** x to the viewer's right, y into the room, mm. */
  protected readonly drawn = computed(() => {
    const { glass, camera, zone } = this.setUp();
    const { left, right, before } = roomExtents(glass, camera.position, zone, null);
    const unit = before / 100;
    const ends = coneOf('plan', camera, before).map(([lens, end]) => `M${lens.across},${lens.z}L${end.across},${end.z}`);
    const pxMm = Math.max((right - left) / usualPx.width, (before + 4 * unit) / usualPx.height);
    return {
      // Outside of what the camera sees nothing else is drawn.
      metres: Array.from({ length: Math.floor(before / 1000) }, (_, i) => ({ at: (i + 1) * 1000, x: right + 6 * pxMm, words: `${i + 1} m` })),
      tick: 5 * pxMm,
      letter: letterPx * pxMm,
      box: `${left} ${-4 * unit} ${right - left} ${before + 4 * unit}`,
      zone: { x: zone.leftMm, y: zone.nearestMm, width: Math.max(zone.rightMm - zone.leftMm, 0), height: Math.max(zone.farthestMm - zone.nearestMm, 0) },
      cone: ends.join(''),
      half: glass.widthMm / 2,
      lens: camera.position,
      unit,
    };
  });
}
