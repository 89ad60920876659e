import type { SceneDocument } from '@oriel/shared/contracts/scenes';
import type { Point2, Point3, Rectangle } from '@oriel/shared/projection/types';
import { walkPath } from '../walk/walk-path';
import { type DrawnLayer, seenFrom } from '../layers/drawn-layer';
import { describeDepth, plainMm, signedMm } from '../../figures/words';
import { acrossOf, glassAcross, sidesOf, spanAcross } from '../../drawing/across';
import { assumedCamera } from './assumed-camera';
import { depthTicks } from '../../drawing/depth-scale';
import { type DepthFrame, type Frame, asPoints, boxOf } from '../../drawing/frames';
import { spreadLabels } from './labels';
import { depthRangeOf, drawnAt } from '../../drawing/placing';

export interface Line {
  readonly from: Point2;
  readonly to: Point2;
}

/** A layer as a line of plan or section. */
export interface DrawnLine extends Line {
  readonly id: string;
  readonly name: string;
  readonly depthMm: number;
  readonly depthText: string;
  readonly valueText: string;
  readonly colour: string;
  readonly shown: boolean;
  readonly selected: boolean;
  /** Where the line runs on past the drawing and is broken off. */
  readonly breaks: readonly Point2[];
  /** Where its name stands; null where there is no room. */
  readonly label: Point2 | null;
  readonly labelWidth: number;
}

/** The points of a line seen through the glass: straight through it, bent at the break and where the depth scale is logarithmic. */
function sightline(frame: DepthFrame, eye: Point3, edge: number, behindMm: number): string {
  const e = acrossOf(frame.view, eye);
  const linear = Math.min(frame.depth.linearToMm, behindMm);
  const { broken } = frame.depth;
  const before = broken && eye.z > broken.atMm ? [-broken.atMm] : [];
  const behind = Array.from({ length: 12 }, (_, i) => linear + ((behindMm - linear) * (i + 1)) / 12);
  const at = (depth: number) => drawnAt(frame, { across: edge + ((edge - e) * depth) / eye.z, z: -depth });
  return asPoints([-eye.z, ...before, 0, linear, ...behind].map(at));
}

export const sightlines = (frame: DepthFrame, { glass }: SceneDocument, eye: Point3) =>
  glassAcross(frame.view, glass).map((edge) => sightline(frame, eye, edge, depthRangeOf(frame).behindMm));

/** What does not depend on the eye or the layers: glass, zone, path, camera, ticks. */
export function drawSetting(frame: DepthFrame, document: SceneDocument) {
  const { glass, zone, homeEye } = document;
  const { behindMm, beforeMm } = depthRangeOf(frame);
  const [from, to] = glassAcross(frame.view, glass);
  const { low, high } = sidesOf(frame.view);
  const camera = assumedCamera(frame.view, glass, zone);
  const zoneBox = boxOf(drawnAt(frame, { across: zone[low], z: zone.nearestMm }), drawnAt(frame, { across: zone[high], z: zone.farthestMm }));
  // From here on only eyes stand before the glass: their distance is printed as z, without a sign, and not as a depth.
  const eyesFromMm = frame.depth.broken?.atMm ?? Math.min(zone.nearestMm, homeEye.z);
  const lens = drawnAt(frame, { across: camera.across, z: 0 });
  // Seen from the side there and back lie on one line: half a turn draws it once.
  const [start, turns] = frame.view === 'plan' ? [0, 1] : [0.25, 0.5];
  const path = Array.from({ length: 73 }, (_, i) => walkPath(zone, homeEye, start + (turns * i) / 72));
  return {
    glass: { from: drawnAt(frame, { across: from, z: 0 }), to: drawnAt(frame, { across: to, z: 0 }) },
    zone: zoneBox,
    path: asPoints(path.map((eye) => drawnAt(frame, { across: acrossOf(frame.view, eye), z: eye.z }))),
    lens,
    cone: camera.slopes.map((slope) =>
      asPoints([0, frame.depth.broken?.atMm ?? 0, beforeMm].map((z) => drawnAt(frame, { across: camera.across + slope * z, z }))),
    ),
    breakLine: frame.depth.broken ? breakLine(frame, frame.depth.broken.atMm) : null,
    pitchDownDeg: camera.pitchDownDeg,
    home: drawnAt(frame, { across: acrossOf(frame.view, homeEye), z: homeEye.z }),
    zoneLabel: zoneLabel(frame, zoneBox),
    ticks: depthTicks(frame.depth, -beforeMm, behindMm).map((depthMm) => ({
      depthMm,
      text: -depthMm >= eyesFromMm ? plainMm(-depthMm) : signedMm(depthMm),
      at: drawnAt(frame, { across: 0, z: -depthMm }),
    })),
  };
}

/** Where the zone's name may stand: in its lower left corner, and in its upper one, as far as the drawing shows them. */
function zoneLabel(frame: DepthFrame, zone: Frame): { readonly low: Point2; readonly high: Point2 } {
  const x = Math.max(zone.left, frame.left) + 8;
  const bottom = Math.min(zone.top + zone.height, frame.top + frame.height);
  return { low: { x, y: bottom - 8 }, high: { x, y: zone.top + 16 } };
}

/** A long break across the drawing: a thin line with two zigzags. */
function breakLine(frame: DepthFrame, atMm: number): string {
  const plan = frame.view === 'plan';
  const [start, length] = plan ? [frame.left, frame.width] : [frame.top, frame.height];
  const at = drawnAt(frame, { across: 0, z: atMm });
  const point = (along: number, out: number) => (plan ? { x: along, y: at.y + out } : { x: at.x + out, y: along });
  const zigzag = [0.04, 0.96].flatMap((share) => {
    const middle = start + share * length;
    return [point(middle - 6, 0), point(middle - 3, -4), point(middle + 3, 4), point(middle + 6, 0)];
  });
  return asPoints([point(start, 0), ...zigzag, point(start + length, 0)]);
}

/** The usual width of a character of a label at 11 px. */
const CHARACTER_PX = 6;
const LABEL_PX = 13;
const BESIDE_LINE_PX = 10;

/** How far below a line words stand clear of it, and how much room they take, px. */
const NOTE_BELOW_PX = 15;
const NOTE_PX = 12;

/** Where words about the glass stand in the plan: below it, and below whatever layers lie so little before it that they would run through. */
export function glassNoteY(glassY: number, lines: readonly Line[]): number {
  const below = lines.map(({ from }) => from.y).filter((y) => y > glassY).sort((a, b) => a - b);
  return below.reduce((noteY, y) => (y < noteY + 3 && y > noteY - NOTE_PX - 3 ? y + NOTE_BELOW_PX : noteY), glassY + NOTE_BELOW_PX);
}

/** The layers as lines at their depth, broken off where they run past the frame. */
export function drawLines(frame: DepthFrame, layers: readonly DrawnLayer[], selectedId: string | null): DrawnLine[] {
  const lines = layers.flatMap((drawn) => (drawn.plane ? [drawLine(frame, drawn, drawn.plane, selectedId)] : []));
  const labels = lines.map(({ id, from, to, wanted, labelWidth }) => ({
    id,
    x: wanted.x,
    y: wanted.y - LABEL_PX,
    width: labelWidth,
    height: LABEL_PX,
    least: Math.max(frame.left, from.x - labelWidth - BESIDE_LINE_PX),
    most: Math.min(frame.left + frame.width - labelWidth, to.x + BESIDE_LINE_PX),
  }));
  const first = (id: string) => (id === selectedId ? 0 : 1);
  const spread = spreadLabels(labels.sort((a, b) => first(a.id) - first(b.id)));
  return lines.map(({ wanted, ...line }) => {
    const x = spread.get(line.id);
    return { ...line, label: x === undefined ? null : { x, y: wanted.y } };
  });
}

function drawLine(frame: DepthFrame, { layer, colour }: DrawnLayer, plane: Rectangle, selectedId: string | null): Omit<DrawnLine, 'label'> & { readonly wanted: Point2 } {
  const { from, to, breaks } = broken(frame, spanAcross(frame.view, plane).map((across) => drawnAt(frame, { across, z: -layer.depthMm })));
  const start = frame.view === 'plan' ? from : to;
  return {
    id: layer.id,
    name: layer.name,
    depthMm: layer.depthMm,
    depthText: signedMm(layer.depthMm),
    valueText: describeDepth(layer.depthMm),
    colour,
    shown: layer.shown,
    selected: layer.id === selectedId,
    from,
    to,
    breaks,
    labelWidth: (layer.name.length + signedMm(layer.depthMm).length + 1) * CHARACTER_PX,
    wanted: { x: start.x + 6, y: layer.depthMm < 0 ? start.y + 14 : start.y - 5 },
  };
}

function broken(frame: DepthFrame, [a, b]: Point2[]): Line & { breaks: Point2[] } {
  const plan = frame.view === 'plan';
  const [start, length] = plan ? [frame.left, frame.width] : [frame.top, frame.height];
  const breaks: Point2[] = [];
  const within = (point: Point2): Point2 => {
    const value = plan ? point.x : point.y;
    const kept = Math.min(Math.max(value, start + 3), start + length - 3);
    const at = plan ? { x: kept, y: point.y } : { x: point.x, y: kept };
    if (kept !== value) breaks.push(at);
    return at;
  };
  return { from: within(a), to: within(b), breaks };
}

/**
 * Projection lines of one layer: from its edge in the elevation square onto the glass, and on along the ray from the eye
 * through that place to the layer's own edge. Where they meet the glass is where the edge is seen.
 */
export function projectionLines(frame: DepthFrame, drawn: DrawnLayer, eye: Point3, elevation: Point2Mapper | null): Line[][] {
  const seen = seenFrom(drawn, eye);
  if (!seen || !drawn.plane) return [];
  const plane = spanAcross(frame.view, drawn.plane);
  return spanAcross(frame.view, seen).flatMap((across, i) => {
    const onGlass = drawnAt(frame, { across, z: 0 });
    const start = elevation ? elevation(seen) : frame.view === 'plan' ? { x: 0, y: frame.top } : { x: frame.left, y: 0 };
    const from = frame.view === 'plan' ? { x: onGlass.x, y: start.y } : { x: start.x, y: onGlass.y };
    if (!insideAcross(frame, onGlass)) return [];
    return [[{ from, to: onGlass }, { from: onGlass, to: drawnAt(frame, { across: plane[i], z: -drawn.layer.depthMm }) }]];
  });
}

/** Where on the paper the lower right corner of a rectangle on the glass is drawn in the elevation. */
export type Point2Mapper = (seen: Rectangle) => Point2;

function insideAcross(frame: DepthFrame, { x, y }: Point2): boolean {
  return frame.view === 'plan'
    ? x >= frame.left && x <= frame.left + frame.width
    : y >= frame.top && y <= frame.top + frame.height;
}
