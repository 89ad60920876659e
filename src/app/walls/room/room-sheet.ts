import { ChangeDetectionStrategy, Component, ElementRef, computed, inject, input, output, signal, viewChild } from '@angular/core';
import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import type { Point3, ViewingZone } from '@oriel/shared/projection/types';
import { sidesOf } from '../../drawing/across';
import { followPointer } from '../../drawing/follow-pointer';
import type { DepthFrame, Frame } from '../../drawing/frames';
import { observedSize } from '../../drawing/observed-size';
import { pointedAt } from '../../drawing/placing';
import { zoneSideAt } from '../../drawing/zone-side';
import { drawElevation, drawView } from './room-drawing';
import { type RoomLayout, layOutRoom, stackRoom } from './room-layout';
import { roomExtents } from './wall-room';
import { unseenWords } from './zone-seen';

const stackBelowPx = 560;
const tallestPx = 760;

/** The set-up's drawing: elevation, plan and section of glass, camera and viewing zone at one scale; the sides of the zone can be dragged. */
@Component({
  selector: 'oriel-room-sheet',
  templateUrl: './room-sheet.html',
  styleUrl: './room-sheet.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RoomSheet {
  readonly setUp = input.required<WallSetUp>();
  /** A marked spot on which someone stands or is to stand: their eye. */
  readonly spot = input<Point3 | null>(null);
  readonly readOnly = input(false);
  readonly zoneChange = output<Partial<ViewingZone>>();

  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly svg = viewChild<ElementRef<SVGSVGElement>>('svg');
  private readonly size = observedSize(() => this.host);
  private readonly held = signal<Held | null>(null);
  private readonly over = signal<Held | null>(null);

  private readonly extents = computed(() => {
    const { glass, camera, zone } = this.setUp();
    return roomExtents(glass, camera.position, zone, this.spot());
  });
  /** While a side is dragged the scale stays as it was when it was taken hold of. */
  protected readonly layout = computed(() => {
    const { width } = this.size();
    const extents = this.held()?.extents ?? this.extents();
    return width < stackBelowPx ? stackRoom(Math.max(width, 200), extents) : layOutRoom({ width, height: Math.min(tallestPx, width * 0.86) }, extents);
  });
  /** What of the zone the camera does not see: hatched, and said. */
  protected readonly unseen = computed(() => unseenWords(this.setUp()));
  protected readonly ready = computed(() => this.size().width > 0);
  protected readonly views = computed(() => [this.layout().plan, this.layout().section].map((frame) => drawView(frame, this.setUp(), this.spot(), clipOf(this.layout(), frame))));
  protected readonly elevation = computed(() => {
    const frame = this.layout().elevation;
    return frame && drawElevation(frame, this.setUp());
  });
  protected readonly cursor = computed(() => {
    const at = this.held() ?? this.over();
    if (!at) return null;
    const { low, high } = sidesOf(at.view);
    return (at.side === low || at.side === high) === (at.view === 'plan') ? 'ew-resize' : 'ns-resize';
  });
  protected readonly heldSide = computed(() => this.held()?.side ?? this.over()?.side ?? null);

  protected hover(event: PointerEvent): void {
    if (event.buttons === 0) this.over.set(this.sideAt(event));
  }

  protected leave(): void {
    this.over.set(null);
  }

  protected press(event: PointerEvent): void {
    const held = this.sideAt(event);
    const svg = this.svg()?.nativeElement;
    if (!held || !svg || event.button !== 0) return;
    const before = this.setUp().zone[held.side];
    this.held.set(held);
    followPointer(event, svg, {
      move: (moved) => this.zoneChange.emit({ [held.side]: this.valueAt(held, moved) }),
      end: () => this.held.set(null),
      cancel: () => {
        this.zoneChange.emit({ [held.side]: before });
        this.held.set(null);
      },
    });
  }

  private sideAt(event: PointerEvent): Held | null {
    if (this.readOnly()) return null;
    const point = this.pointAt(event);
    for (const frame of [this.layout().plan, this.layout().section]) {
      const side = zoneSideAt(frame, point, this.setUp().zone, event.pointerType === 'mouse' ? 6 : 16);
      if (side) return { view: frame.view, side, extents: this.extents() };
    }
    return null;
  }

  /** Where the pointer asks the side to be, kept in order with the side across from it; whole centimetres. */
  private valueAt({ view, side }: Held, event: PointerEvent): number {
    const layout = this.layout();
    const { across, z } = pointedAt(view === 'plan' ? layout.plan : layout.section, this.pointAt(event));
    const { zone } = this.setUp();
    const value = Math.round((side === 'nearestMm' || side === 'farthestMm' ? z : across) / 10) * 10;
    switch (side) {
      case 'leftMm':
        return Math.min(value, zone.rightMm - 10);
      case 'rightMm':
        return Math.max(value, zone.leftMm + 10);
      case 'lowestMm':
        return Math.min(value, zone.highestMm - 10);
      case 'highestMm':
        return Math.max(value, zone.lowestMm + 10);
      case 'nearestMm':
        return Math.max(Math.min(value, zone.farthestMm), 100);
      case 'farthestMm':
        return Math.max(value, zone.nearestMm);
    }
  }

  private pointAt(event: PointerEvent) {
    const box = this.svg()!.nativeElement.getBoundingClientRect();
    return { x: event.clientX - box.left, y: event.clientY - box.top };
  }
}

/** What a view may draw on: its own frame, and where nothing else stands beside it. */
function clipOf(layout: RoomLayout, frame: DepthFrame): Frame {
  const right = layout.width - frame.left;
  return frame.view === 'plan'
    ? { left: 0, top: frame.top, width: layout.width, height: frame.height }
    : { left: frame.left, top: frame.top - 6, width: right, height: frame.height + 12 };
}

interface Held {
  readonly view: DepthFrame['view'];
  readonly side: keyof ViewingZone;
  readonly extents: ReturnType<typeof roomExtents>;
}
