import type { WallSetUp } from '@oriel/shared/contracts/wall-set-up';
import { upFromAcross } from '@oriel/shared/viewer/field-of-view';
import { acrossOf, sidesOf } from '../../drawing/across';
import type { DepthFrame } from '../../drawing/frames';
import type { Across } from '../../drawing/placing';
import { plainMm } from '../../figures/words';
import { degrees } from '../../screen/screen-measure';
import { coneOf, picture } from './wall-room';

/** How a view's zone lies in what the camera sees: angles from straight ahead, seen from the lens, toward the view's own across. */
interface Angles {
  readonly cone: readonly [low: number, high: number];
  readonly zone: readonly [low: number, high: number];
}

/** A corner this little outside is drawn as seen: no set-up is that exact. */
const slackRad = (0.1 * Math.PI) / 180;

/** The part of the zone that the camera sees in a view; empty where it sees none of it. */
export function seenPart(view: DepthFrame['view'], { camera, zone }: WallSetUp): readonly Across[] {
  const { low, high } = sidesOf(view);
  const corners: Across[] = [
    { across: zone[low], z: zone.nearestMm },
    { across: zone[high], z: zone.nearestMm },
    { across: zone[high], z: zone.farthestMm },
    { across: zone[low], z: zone.farthestMm },
  ];
  const lens = { across: acrossOf(view, camera.position), z: camera.position.z };
  const [lowEnd, highEnd] = coneOf(view, camera, zone.farthestMm)
    .map(([, end]) => end)
    .sort((a, b) => angleOf(lens, a) - angleOf(lens, b));
  // Left of the line toward the lower edge, right of the line toward the upper one.
  return cut(cut(corners, (at) => turn(lens, lowEnd, at)), (at) => -turn(lens, highEnd, at));
}

/** In words, what of the zone the camera does not see and what mends it; empty where it sees all. */
export function unseenWords(setUp: WallSetUp): string[] {
  return (['section', 'plan'] as const).flatMap((view) => {
    const angles = anglesOf(view, setUp);
    const [lacksLow, lacksHigh] = [angles.cone[0] - angles.zone[0], angles.zone[1] - angles.cone[1]].map((rad) => rad > slackRad);
    return lacksLow || lacksHigh ? [`${whatIsLost(view, lacksLow, lacksHigh)} ${remedy(view, angles)}`] : [];
  });
}

function whatIsLost(view: DepthFrame['view'], low: boolean, high: boolean): string {
  const [below, above] = view === 'plan' ? ['on the left', 'on the right'] : ['low down', 'high up'];
  const where = low && high ? `${below} and ${above}` : low ? below : above;
  return `The camera does not see all of the viewing zone: nobody is followed whose eyes are ${where} and near.`;
}

function remedy(view: DepthFrame['view'], { cone, zone }: Angles): string {
  const [needed, given] = [zone[1] - zone[0], cone[1] - cone[0]];
  if (needed > given) {
    const across = view === 'plan' ? needed : upFromAcross(needed, picture.heightPx, picture.widthPx);
    return `It would have to see ${plainMm(degrees(across), 0)}° across for that: begin the zone farther away, or take a camera that sees wider.`;
  }
  const by = (zone[0] + zone[1] - cone[0] - cone[1]) / 2;
  const way = view === 'plan' ? (by > 0 ? 'to the right' : 'to the left') : by > 0 ? 'up' : 'down';
  return `Turn it about ${Math.max(1, Math.round(Math.abs(degrees(by))))}° farther ${way} and it sees all.`;
}

function anglesOf(view: DepthFrame['view'], { camera, zone }: WallSetUp): Angles {
  const { low, high } = sidesOf(view);
  const lens = { across: acrossOf(view, camera.position), z: camera.position.z };
  const order = (angles: number[]) => [Math.min(...angles), Math.max(...angles)] as const;
  const corners = [zone[low], zone[high]].flatMap((across) => [zone.nearestMm, zone.farthestMm].map((z) => angleOf(lens, { across, z })));
  return { cone: order(coneOf(view, camera, zone.farthestMm).map(([, end]) => angleOf(lens, end))), zone: order(corners) };
}

const angleOf = (lens: Across, at: Across) => Math.atan2(at.across - lens.across, at.z - lens.z);

/** Positive on that side of the line from the lens to `end` that lies toward greater across. */
const turn = (lens: Across, end: Across, at: Across) =>
  (end.z - lens.z) * (at.across - lens.across) - (end.across - lens.across) * (at.z - lens.z);

/** The part of a convex polygon where a linear function is not negative (I. Sutherland, G. Hodgman, 1974). */
function cut(corners: readonly Across[], inside: (at: Across) => number): Across[] {
  return corners.flatMap((to, index) => {
    const from = corners[(index + corners.length - 1) % corners.length];
    const [a, b] = [inside(from), inside(to)];
    const share = a / (a - b);
    const crossing = { across: from.across + (to.across - from.across) * share, z: from.z + (to.z - from.z) * share };
    return [...(a < 0 !== b < 0 ? [crossing] : []), ...(b >= 0 ? [to] : [])];
  });
}
