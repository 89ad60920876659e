import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Point3 } from '@oriel/shared/projection/types';
import { upFromAcross } from '@oriel/shared/viewer/field-of-view';
import { NOBODY, type People } from './people';
import type { Subject } from '../subject/bench-subject';

/** Cameras are taken to deliver 16:9; only the cone in the section depends on it. */
const SHAPE = { width: 16, height: 9 };
/** How far the drawing reaches where no viewing zone says it, and beyond one that does. */
const USUAL_REACH_MM = 2500;
const ROOM = 1.2;
/** From one line of the scale to the next. */
const SCALE_MM = 1000;

/** Plan and section of the glass, the camera, the viewing zone and the eye, to one scale. Lengths in mm. */
@Component({
  selector: 'oriel-eye-drawing',
  template: `
    @for (view of views(); track view.name) {
      <figure>
        <svg [attr.viewBox]="view.box" role="img" [attr.aria-label]="view.name + ': glass, camera and eye'">
          @if (view.zone; as zone) {
            <rect
              class="zone"
              [attr.x]="zone.x"
              [attr.y]="zone.y"
              [attr.width]="zone.width"
              [attr.height]="zone.height"
            />
          }
          @for (mark of view.scale; track mark.words) {
            <path class="scale" [attr.d]="mark.line" />
          }
          <path class="cone" [attr.d]="view.cone" />
          @for (mark of view.scale; track mark.words) {
            <text class="over-lines" [attr.x]="mark.at.x" [attr.y]="mark.at.y" [attr.font-size]="3.6 * view.unit" [attr.stroke-width]="1.6 * view.unit">{{ mark.words }}</text>
          }
          <path class="glass" [attr.d]="view.glass" />
          <circle class="lens" [attr.cx]="view.lens.x" [attr.cy]="view.lens.y" [attr.r]="view.unit" />
          @for (other of view.others; track other.id) {
            <circle class="other" [attr.cx]="other.at.x" [attr.cy]="other.at.y" [attr.r]="1.8 * view.unit" />
            <text text-anchor="middle" [attr.x]="other.at.x" [attr.y]="other.at.y + 5.6 * view.unit" [attr.font-size]="4 * view.unit">another</text>
          }
          @if (view.eye; as eye) {
            <path class="sight" [attr.d]="view.sight" />
            <circle class="eye followed" [attr.cx]="eye.x" [attr.cy]="eye.y" [attr.r]="1.8 * view.unit" />
            @if (people().others.length) {
              <text text-anchor="middle" [attr.x]="eye.x" [attr.y]="eye.y - 3.2 * view.unit" [attr.font-size]="4 * view.unit">followed</text>
            }
          }
        </svg>
        <figcaption class="marginal">{{ view.name }}{{ view.beyond ? '. The eye is beyond the drawing.' : '' }}</figcaption>
      </figure>
    }
  `,
  styleUrl: '../../drawing/views.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EyeDrawing {
  readonly subject = input.required<Subject>();
  readonly eye = input<Point3 | null>(null);
  readonly people = input<People>(NOBODY);

  /** How far into the room the drawing reaches: it depends on the wall alone, so that the scale stays while somebody moves. */
  private readonly reach = computed(() => {
    const { zone, glass } = this.subject();
    return Math.max(zone ? ROOM * zone.farthestMm : USUAL_REACH_MM, 1.6 * glass.widthMm);
  });

  protected readonly views = computed(() => {
    const { glass, zone, tracking } = this.subject();
    const { position, hfovRad, yawRad, pitchRad } = tracking.camera;
    const eye = this.eye();
    const { others } = this.people();
    const up = upFromAcross(hfovRad, SHAPE.width, SHAPE.height);
    return [
      this.view('Plan, from above', (across, z) => ({ x: across, y: z }), {
        half: glass.widthMm / 2,
        lens: { across: position.x, z: position.z, turn: yawRad, field: hfovRad },
        zone: zone && [zone.leftMm, zone.rightMm, zone.nearestMm, zone.farthestMm],
        eye: eye && { across: eye.x, z: eye.z },
        others: others.map(({ id, eye: { x, z } }) => ({ id, across: x, z })),
      }),
      this.view('Section, from the side', (across, z) => ({ x: z, y: -across }), {
        half: glass.heightMm / 2,
        lens: { across: position.y, z: position.z, turn: pitchRad, field: up },
        zone: zone && [zone.lowestMm, zone.highestMm, zone.nearestMm, zone.farthestMm],
        eye: eye && { across: eye.y, z: eye.z },
        others: others.map(({ id, eye: { y, z } }) => ({ id, across: y, z })),
      }),
    ];
  });

  private view(name: string, place: (across: number, z: number) => { x: number; y: number }, room: Room) {
    const reach = this.reach();
    const side = Math.max(0.5 * reach, 1.2 * room.half);
    const corner = (across: number, z: number) => {
      const { x, y } = place(across, z);
      return `${x},${y}`;
    };
    const { lens } = room;
    const end = (half: number) =>
      corner(lens.across + reach * Math.sin(lens.turn + half), lens.z + reach * Math.cos(lens.turn + half));
    const boxFrom = place(-side, -0.06 * reach);
    const boxTo = place(side, 1.02 * reach);
    return {
      name,
      unit: reach / 80,
      box: boxOf(boxFrom, boxTo).join(' '),
      glass: `M${corner(-room.half, 0)} L${corner(room.half, 0)}`,
      scale: Array.from({ length: Math.floor(reach / SCALE_MM) }, (_, i) => (i + 1) * SCALE_MM).map((z) => ({
        line: `M${corner(-side, z)} L${corner(side, z)}`,
        at: markPlace(place(-side, z), place(side, z), reach / 80),
        words: `${z / SCALE_MM} m`,
      })),
      lens: place(lens.across, lens.z),
      cone: `M${end(-lens.field / 2)} L${corner(lens.across, lens.z)} L${end(lens.field / 2)}`,
      zone: room.zone && rectangleOf(boxOf(place(room.zone[0], room.zone[2]), place(room.zone[1], room.zone[3]))),
      eye: room.eye && place(room.eye.across, room.eye.z),
      beyond: room.eye !== null && (Math.abs(room.eye.across) > side || room.eye.z > 1.02 * reach),
      others: room.others.map(({ id, across, z }) => ({ id, at: place(across, z) })),
      sight: room.eye && `M${corner(-room.half, 0)} L${corner(room.eye.across, room.eye.z)} L${corner(room.half, 0)}`,
    };
  }
}

/** Where the words of a line of the scale stand: at its left end, just above it; beside it where it is upright. */
const markPlace = (from: { x: number; y: number }, to: { x: number; y: number }, unit: number) => ({
  x: Math.min(from.x, to.x) + unit,
  y: Math.max(from.y, to.y) - unit,
});

interface Room {
  readonly half: number;
  readonly lens: { readonly across: number; readonly z: number; readonly turn: number; readonly field: number };
  readonly zone: readonly [number, number, number, number] | null;
  readonly eye: { readonly across: number; readonly z: number } | null;
  readonly others: readonly { readonly id: number; readonly across: number; readonly z: number }[];
}

type Box = readonly [number, number, number, number];

const boxOf = (a: { x: number; y: number }, b: { x: number; y: number }): Box => [
  Math.min(a.x, b.x),
  Math.min(a.y, b.y),
  Math.abs(b.x - a.x),
  Math.abs(b.y - a.y),
];

const rectangleOf = ([x, y, width, height]: Box) => ({ x, y, width, height });
