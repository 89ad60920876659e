import type { DepthFrame, ElevationFrame, Room } from '../../drawing/frames';
import type { RoomExtents } from './wall-room';

/** Three views of a wall at one scale. Everything stands before the glass, so depth is drawn linearly. */
export interface RoomLayout extends Room {
  readonly elevation: ElevationFrame | null;
  readonly plan: DepthFrame;
  readonly section: DepthFrame;
  readonly pxPerMm: number;
}

const MARGIN = 22;
const GAP = 26;
/** Room behind the glass for its line and label, px. */
const BEHIND = 12;
const wholly = Number.MAX_SAFE_INTEGER;

/** As the composer's sheet: elevation, the plan below it, the section to its right; the right lower corner stays free for the title block. */
export function layOutRoom(room: Room, extents: RoomExtents): RoomLayout {
  const across = extents.right - extents.left;
  const up = extents.above - extents.below;
  const pxPerMm = Math.min(
    (room.width - 2 * MARGIN - GAP - BEHIND) / (across + extents.before),
    (room.height - 2 * MARGIN - GAP - BEHIND) / (up + extents.before),
  );
  const upper = { top: MARGIN, height: up * pxPerMm };
  const leftward = { left: MARGIN, width: across * pxPerMm };
  const centreX = leftward.left - extents.left * pxPerMm;
  const centreY = upper.top + extents.above * pxPerMm;
  const depthPx = extents.before * pxPerMm + BEHIND;
  const plan = { ...leftward, top: upper.top + upper.height + GAP, height: depthPx };
  const section = { ...upper, left: leftward.left + leftward.width + GAP, width: depthPx };
  return {
    width: room.width,
    height: plan.top + plan.height + MARGIN,
    pxPerMm,
    elevation: { ...leftward, ...upper, centreX, centreY, pxPerMm },
    plan: depthFrame('plan', plan, centreX, plan.top + BEHIND, pxPerMm),
    section: depthFrame('section', section, centreY, section.left + BEHIND, pxPerMm),
  };
}

/** On a narrow page plan and section one above the other, still at one scale. */
export function stackRoom(width: number, extents: RoomExtents): RoomLayout {
  const across = extents.right - extents.left;
  const up = extents.above - extents.below;
  const pxPerMm = (width - 2 * MARGIN - BEHIND) / Math.max(across, extents.before);
  const plan = { left: (width - across * pxPerMm) / 2, top: MARGIN, width: across * pxPerMm, height: extents.before * pxPerMm + BEHIND };
  const section = { left: MARGIN, top: plan.top + plan.height + GAP, width: extents.before * pxPerMm + BEHIND, height: up * pxPerMm };
  return {
    width,
    height: section.top + section.height + MARGIN,
    pxPerMm,
    elevation: null,
    plan: depthFrame('plan', plan, plan.left - extents.left * pxPerMm, plan.top + BEHIND, pxPerMm),
    section: depthFrame('section', section, section.top + extents.above * pxPerMm, section.left + BEHIND, pxPerMm),
  };
}

const depthFrame = (view: DepthFrame['view'], frame: { left: number; top: number; width: number; height: number }, centre: number, glassAt: number, pxPerMm: number): DepthFrame => ({
  view,
  ...frame,
  centre,
  glassAt,
  pxPerMm,
  depth: { pxPerMm, linearToMm: wholly },
});
