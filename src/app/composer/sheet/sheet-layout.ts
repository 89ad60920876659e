import type { Glass } from '@oriel/shared/projection/types';
import { drawnDepth, linearDepthOf } from '../../drawing/depth-scale';
import type { DepthFrame, ElevationFrame, Frame, Room } from '../../drawing/frames';

export interface SheetLayout {
  readonly width: number;
  readonly height: number;
  readonly elevation: ElevationFrame;
  readonly plan: DepthFrame;
  readonly section: DepthFrame;
}

/** What must fit on the sheet. */
export interface Extents {
  readonly glass: Glass;
  /** The farthest depth behind the glass, mm. */
  readonly behindMm: number;
  /** The nearest layer before the glass, mm. */
  readonly frontMm: number;
  /** The farthest eye before the glass, mm. */
  readonly beforeMm: number;
}

const MARGIN = 26;
const GAP = 30;
/** Kept free at the foot of the sheet for its controls, px. */
const FOOT = 34;
/** Beside the glass for what runs past it, px. */
const BESIDE = 26;
const ABOVE = 18;
const MOST_DEPTH_PX = 460;
const UNDER_SECTION = 260;

/**
 * The three views for a sheet of this size: the elevation as large as leaves plan and section room to be read, the plan
 * sharing its x axis and scale, the section its y axis and scale. Room to spare widens the plan.
 */
export function layOutSheet(room: Room, extents: Extents): SheetLayout {
  const { glass } = extents;
  const across = Math.max(room.width - 2 * MARGIN - GAP, 120);
  const down = Math.max(room.height - 2 * MARGIN - GAP - FOOT, 120);
  const leastPlan = Math.max(down * (glass.heightMm > glass.widthMm ? 0.31 : 0.37), 120);
  // The title block stands under the section on a wide sheet, and the plan's figures before it.
  const leastSection = Math.max(across * 0.25, across > 780 ? UNDER_SECTION : 120);
  const pxPerMm = Math.max(
    Math.min((across - leastSection - 2 * BESIDE) / glass.widthMm, (down - leastPlan - 2 * ABOVE) / glass.heightMm),
    20 / Math.max(glass.widthMm, glass.heightMm),
  );
  const glassPx = { width: glass.widthMm * pxPerMm, height: glass.heightMm * pxPerMm };
  const planDepth = Math.min(down - glassPx.height - 2 * ABOVE, MOST_DEPTH_PX);
  const sectionDepth = Math.min(across - glassPx.width - 2 * BESIDE, MOST_DEPTH_PX, Math.max(UNDER_SECTION, 1.5 * planDepth));
  const beside = BESIDE + (across - glassPx.width - 2 * BESIDE - sectionDepth) / 2;
  const above = ABOVE + Math.max(down - glassPx.height - 2 * ABOVE - planDepth, 0) / 2;

  const upper = { top: MARGIN, height: glassPx.height + 2 * above };
  const leftward = { left: MARGIN, width: glassPx.width + 2 * beside };
  const centreX = leftward.left + leftward.width / 2;
  const centreY = upper.top + upper.height / 2;
  const plan = { ...leftward, top: upper.top + upper.height + GAP, height: planDepth };
  const section = { ...upper, left: leftward.left + leftward.width + GAP, width: sectionDepth };
  return {
    ...room,
    elevation: { ...leftward, ...upper, centreX, centreY, pxPerMm },
    plan: { view: 'plan', ...plan, centre: centreX, pxPerMm, ...alongDepth(plan.top, plan.height, extents) },
    section: { view: 'section', ...section, centre: centreY, pxPerMm, ...alongDepth(section.left, section.width, extents) },
  };
}

/** On a phone each view has a pane of its own; elevation and plan keep one x axis, for they stand one above the other. */
export function layOutPanes(elevation: Room, pane: Room, extents: Extents): SheetLayout {
  const { glass } = extents;
  const beside = 20;
  const pxPerMm = Math.min((elevation.width - 2 * beside) / glass.widthMm, (elevation.height - 24) / glass.heightMm);
  const sectionScale = Math.min((pane.height - 64) / glass.heightMm, pxPerMm);
  const whole = { left: 0, top: 0 };
  return {
    width: elevation.width,
    height: elevation.height,
    elevation: { ...whole, ...elevation, centreX: elevation.width / 2, centreY: elevation.height / 2, pxPerMm },
    plan: { view: 'plan', ...whole, ...pane, centre: pane.width / 2, pxPerMm, ...alongDepth(8, pane.height - 16, extents) },
    section: {
      view: 'section',
      ...whole,
      ...pane,
      centre: pane.height / 2,
      pxPerMm: sectionScale,
      ...alongDepth(8, pane.width - 16, extents),
    },
  };
}

/** The layers' part of the depth axis is to be this share of it; the viewers' part is shortened for it. */
const LAYERS_SHARE = 0.55;
/** Shortened by more than this, sightlines would bend too sharply to be read. */
const LEAST_BEYOND = 0.35;
/** Room before the glass for its own figures, in longer sides of the glass. */
const BEFORE_GLASS = 0.16;

function alongDepth(start: number, length: number, { glass, behindMm, frontMm, beforeMm }: Extents) {
  const wantedBreak = Math.max(1.3 * frontMm, BEFORE_GLASS * Math.max(glass.widthMm, glass.heightMm));
  const atMm = Math.min(wantedBreak, beforeMm / 2);
  const linearToMm = linearDepthOf(glass);
  const behind = drawnDepth(behindMm, { linearToMm });
  const shortened = ((behind + atMm) * (1 / LAYERS_SHARE - 1)) / (beforeMm - atMm);
  const beyond = Math.min(Math.max(shortened, LEAST_BEYOND), 1);
  const pxPerMm = Math.max(length, 10) / (behind + atMm + beyond * (beforeMm - atMm));
  return { glassAt: start + behind * pxPerMm, depth: { pxPerMm, linearToMm, broken: beyond < 1 ? { atMm, beyond } : undefined } };
}

/** The same sheet drawn larger: every place and scale by one factor, so that the views stay aligned. */
export function enlarge(layout: SheetLayout, factor: number): SheetLayout {
  const frame = <F extends Frame>(f: F): F => ({
    ...f,
    left: f.left * factor,
    top: f.top * factor,
    width: f.width * factor,
    height: f.height * factor,
  });
  const depthFrame = (f: DepthFrame): DepthFrame => ({
    ...frame(f),
    centre: f.centre * factor,
    pxPerMm: f.pxPerMm * factor,
    glassAt: f.glassAt * factor,
    depth: { ...f.depth, pxPerMm: f.depth.pxPerMm * factor },
  });
  const { elevation } = layout;
  return {
    width: layout.width * factor,
    height: layout.height * factor,
    elevation: {
      ...frame(elevation),
      centreX: elevation.centreX * factor,
      centreY: elevation.centreY * factor,
      pxPerMm: elevation.pxPerMm * factor,
    },
    plan: depthFrame(layout.plan),
    section: depthFrame(layout.section),
  };
}
