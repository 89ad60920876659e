import { readFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import { CANONICAL_FACE_CM, LANDMARK_COUNT } from '@oriel/shared/viewer/canonical-face';
import { regionOfLandmarks } from '../../src/app/tracking/face-landmarks';
import type { FaceModels } from '../../src/app/tracking/face-models';
import { Looks } from '../../src/app/tracking/looks';
import type { Region } from '../../src/app/tracking/region';
import { RgbaPicture } from '../../src/app/tracking/rgba-picture';
import { loadFaceModels } from '../../src/app/tracking/tfjs-face-models';
import { triangulate } from './delaunay';
import type { Point } from './flat-face';
import { readPicture, type StillPicture } from './still-picture';
import { cutOut, mipLevels, mirrored, tinted, withGlasses, type Disguise } from './texture';
import type { HeadCorner, Place, TurningHead } from './turning-head';

/** A photographed person: pupils (the subject's right and left) and the outlines of head and body, in pixels of the picture. */
export interface Portrait {
  readonly picture: StillPicture;
  readonly rightEye: Point;
  readonly leftEye: Point;
  readonly outlines: readonly (readonly Point[])[];
}

/** How a person is made of a portrait. */
export interface Person extends Disguise {
  /** Whose depth the face has: what the landmark model sees in the portrait, or that of the canonical face. */
  readonly relief: 'own' | 'canonical';
  /** The depth is this many times as great. */
  readonly depth: number;
}

/** Three persons of one portrait: as it is, and two others whose shape is not the landmark model's own idea of it. */
export const PEOPLE: readonly Person[] = [
  { relief: 'own', depth: 1 },
  { relief: 'canonical', depth: 1.08, mirrored: true, tint: [0.82, 0.78, 0.8] },
  { relief: 'canonical', depth: 0.92, tint: [1, 0.9, 0.78] },
];

/** Distance between the pupils of every person, mm: the adult mean of N. Dodgson, Proc. SPIE 5291, 2004. */
export const HEAD_IPD_MM = 63.4;

/** The landmarks that bound the face, in turn about it (numbering of the MediaPipe face mesh). */
const OVAL = [
  10, 338, 297, 332, 284, 251, 389, 356, 454, 323, 361, 288, 397, 365, 379, 378, 400, 377, 152, 148, 176, 149, 150, 136,
  172, 58, 132, 93, 234, 127, 162, 21, 54, 103, 67, 109,
] as const;
/** Landmarks that mirror each other: lines across the head. */
const PAIRS = [
  [33, 263],
  [133, 362],
  [61, 291],
  [234, 454],
  [127, 356],
  [172, 397],
  [129, 358],
  [117, 346],
  [54, 284],
] as const;
const [FOREHEAD, CHIN, UPPER_LIP, LOWER_LIP] = [10, 152, 13, 14];

/** The portrait that comes with the tests; outlines traced by hand. */
export async function testPortrait(): Promise<Portrait> {
  const head: Point[] = [[153, 75], [160, 50], [180, 32], [205, 19], [235, 14], [265, 25], [288, 45], [300, 75], [298, 100], [285, 125], [270, 128], [262, 150], [255, 185], [190, 185], [180, 130], [168, 118], [157, 100]]; // prettier-ignore
  const body: Point[] = [[190, 165], [255, 165], [300, 205], [330, 245], [350, 290], [360, 350], [380, 512], [25, 512], [35, 400], [60, 280], [110, 205], [150, 160]]; // prettier-ignore
  return {
    picture: await readPicture(fileURLToPath(new URL('./face.png', import.meta.url))),
    rightEye: [203.7, 101.8],
    leftEye: [246.3, 103.6],
    outlines: [head, body],
  };
}

/** The persons to be rendered, from the portrait that comes with the tests. */
export async function testHeads(people: readonly Person[]): Promise<TurningHead[]> {
  const folder = fileURLToPath(new URL('../../assets/tracker/', import.meta.url));
  const read = async (name: string): Promise<ArrayBuffer> => new Uint8Array(await readFile(folder + name)).buffer;
  const models = await loadFaceModels({ folder, read });
  const portrait = await testPortrait();
  const heads = people.map((person) => headOf(disguised(portrait, person), person, models));
  models.dispose();
  return heads;
}

function disguised(portrait: Portrait, { mirrored: mirror, tint, glasses }: Disguise): Portrait {
  const across = ([x, y]: Point): Point => [mirror ? portrait.picture.width - x : x, y];
  const rightEye = across(mirror ? portrait.leftEye : portrait.rightEye);
  const leftEye = across(mirror ? portrait.rightEye : portrait.leftEye);
  const outlines = portrait.outlines.map((outline) => outline.map(across));
  let picture = mirror ? mirrored(portrait.picture) : portrait.picture;
  if (tint) picture = tinted(picture, tint);
  if (glasses) picture = withGlasses(picture, rightEye, leftEye);
  return { picture, rightEye, leftEye, outlines };
}

/** The portrait's landmarks become a mesh in space; rings about the face carry hair, ears and neck backwards as on a skull. */
function headOf(portrait: Portrait, { relief, depth }: Person, models: FaceModels): TurningHead {
  const { picture, rightEye, leftEye } = portrait;
  const landmarks = landmarksOf(portrait, models);
  const face =
    relief === 'canonical'
      ? withCanonicalRelief(landmarks, depth)
      : landmarks.map(([x, y, z]): Place => [x, y, z * depth]);
  const flat = (places: readonly Place[]): Point[] => places.map(([x, y]) => [x, y]);
  const faceTriangles = triangulate(flat(face));
  const pupils = [rightEye, leftEye].map(([x, y]): Place => {
    const hit = faceTriangles
      .map((corners) =>
        depthWithin(
          corners.map((corner) => face[corner]),
          x,
          y,
        ),
      )
      .find((z) => z !== null);
    if (hit === undefined) throw new Error('A pupil lies outside of the face.');
    return [x, y, hit];
  });
  const toHead = headFrame(face, pupils);
  const ringed = [
    ...face.map((place) => ({ place, opacity: 1 })),
    ...rings(face, Math.hypot(...minus(pupils[1], pupils[0]))),
  ];
  const corners = ringed.map(({ place, opacity }, k): HeadCorner => ({
    place: toHead(place),
    texture: [place[0], place[1]],
    opacity,
    ofFace: k < LANDMARK_COUNT,
  }));
  return {
    corners,
    triangles: triangulate(ringed.map(({ place }) => [place[0], place[1]])),
    body: bodyBelow(picture, face, toHead),
    levels: mipLevels(cutOut(picture, portrait.outlines)),
    rightEye: toHead(pupils[0]),
    leftEye: toHead(pupils[1]),
    mouthMm: (toHead(face[UPPER_LIP])[1] + toHead(face[LOWER_LIP])[1]) / 2,
  };
}

/** Looks averaged, at three sizes and three places of the region, so that no one look's error becomes the head's shape. */
function landmarksOf({ picture, rightEye, leftEye }: Portrait, models: FaceModels): Place[] {
  const rgba = new Uint8Array(picture.width * picture.height * 4);
  for (let at = 0; at < picture.width * picture.height; at++)
    rgba.set(picture.data.subarray(3 * at, 3 * at + 3), 4 * at);
  const frame = new RgbaPicture(picture.width, picture.height, rgba);
  const looks = new Looks(models);
  const unit = Math.hypot(leftEye[0] - rightEye[0], leftEye[1] - rightEye[1]);
  let region: Region = {
    cx: (rightEye[0] + leftEye[0]) / 2,
    cy: (rightEye[1] + leftEye[1]) / 2 + 0.35 * unit,
    size: 3.6 * unit,
    angleRad: Math.atan2(leftEye[1] - rightEye[1], leftEye[0] - rightEye[0]),
  };
  for (let look = 0; look < 4; look++) {
    if (looks.landmarks(frame, region) < 0.5) throw new Error('The landmark model sees no face in the portrait.');
    region = regionOfLandmarks(looks.points);
  }
  const sum = new Float64Array(3 * LANDMARK_COUNT);
  const views = [0.94, 1, 1.06].flatMap((zoom) =>
    [-2, 0, 2].map((shift) => ({ ...region, size: region.size * zoom, cx: region.cx + shift })),
  );
  for (const view of views) {
    looks.landmarks(frame, view);
    looks.points.forEach((value, k) => (sum[k] += value / views.length));
  }
  return Array.from({ length: LANDMARK_COUNT }, (_, i): Place => [sum[3 * i], sum[3 * i + 1], sum[3 * i + 2]]);
}

/**
 * The face with the depth of the canonical one, fitted to it in the picture: z = a + b x + c y + depth s z', by least squares in a, b and c, so
 * that the portrait keeps its own tilt.
 */
function withCanonicalRelief(face: readonly Place[], depth: number): Place[] {
  const canonical = face.map((_, i): Place => [
    CANONICAL_FACE_CM[3 * i],
    -CANONICAL_FACE_CM[3 * i + 1],
    -CANONICAL_FACE_CM[3 * i + 2],
  ]);
  const [own, other] = [face, canonical].map(middleOf);
  const breadth = (places: readonly Place[], [mx, my]: Place): number =>
    Math.sqrt(places.reduce((sum, [x, y]) => sum + (x - mx) ** 2 + (y - my) ** 2, 0));
  const scale = (depth * breadth(face, own)) / breadth(canonical, other);
  const reliefs = canonical.map(([, , z]) => scale * (z - other[2]));
  const rows = face.map(([x, y]): Place => [1, x - own[0], y - own[1]]);
  const rest = face.map(([, , z], i) => z - reliefs[i]);
  const normal = [0, 1, 2].map(
    (j) => [0, 1, 2].map((k) => rows.reduce((sum, row) => sum + row[j] * row[k], 0)) as unknown as Place,
  );
  const right = [0, 1, 2].map((j) => rows.reduce((sum, row, i) => sum + row[j] * rest[i], 0));
  const determinant = ([a, b, c]: readonly Place[]): number => dot(a, cross(b, c));
  const tilt = [0, 1, 2].map(
    (j) =>
      determinant(normal.map((row, i) => row.map((value, k) => (k === j ? right[i] : value)) as unknown as Place)) /
      determinant(normal),
  ) as unknown as Place;
  return face.map(([x, y], i): Place => [x, y, dot(tilt, rows[i]) + reliefs[i]]);
}

/** How far each ring lies from the face's edge, as a share of the whole way out. */
const RINGS = [0.12, 0.3, 0.5, 0.75, 1];

function rings(face: readonly Place[], ipd: number): { place: Place; opacity: number }[] {
  const mm = ipd / HEAD_IPD_MM;
  const [cx, cy] = middleOf(OVAL.map((i) => face[i]));
  return RINGS.flatMap((share, ring) =>
    OVAL.map((i) => {
      const [dx, dy] = [face[i][0] - cx, face[i][1] - cy];
      const up = -dy / Math.hypot(dx, dy);
      const out = 1 + share * (0.55 + (up > 0 ? 0.75 : 0.37) * up);
      // The skull goes back less at the crown than at the ears, and the neck little.
      const back = mm * (up > 0.3 ? 70 : 85) * share ** 1.2 * (up < -0.5 ? 0.4 : 1);
      const opacity = ring === RINGS.length - 1 ? 0 : up < -0.75 && ring > 1 ? 0.4 : 1;
      return { place: [cx + out * dx, cy + out * dy, face[i][2] + back], opacity };
    }),
  );
}

/** The part of the picture below the mouth as a flat sheet, coming in from the chin. */
function bodyBelow(
  picture: StillPicture,
  face: readonly Place[],
  toHead: (place: Place) => Place,
): TurningHead['body'] {
  const [lip, chin] = [face[LOWER_LIP][1], face[CHIN][1]];
  const rows = [
    { y: lip + 0.55 * (chin - lip), opacity: 0 },
    { y: lip + 1.35 * (chin - lip), opacity: 1 },
    { y: picture.height, opacity: 1 },
  ];
  const corners = rows.flatMap(({ y, opacity }) =>
    [0, picture.width].map((x): HeadCorner => {
      const [mx, my] = toHead([x, y, 0]);
      return { place: [mx, my, 0], texture: [x, y], opacity, ofFace: false };
    }),
  );
  return { corners, triangles: [[0, 1, 2], [1, 3, 2], [2, 3, 4], [3, 5, 4]] }; // prettier-ignore
}

/** From the picture to the head that faces the camera: across by the pairs, down from forehead to chin, mm from between the pupils. */
function headFrame(face: readonly Place[], [right, left]: readonly Place[]): (place: Place) => Place {
  const lines = PAIRS.map(([i, j]) => unitOf(minus(face[j], face[i])));
  const across = unitOf(middleOf(lines));
  const fall = minus(face[CHIN], face[FOREHEAD]);
  const down = unitOf(minus(fall, across.map((value) => value * dot(fall, across)) as unknown as Place));
  const away = cross(across, down);
  const middle = middleOf([right, left]);
  const mm = HEAD_IPD_MM / Math.hypot(...minus(left, right));
  return (place) => {
    const from = minus(place, middle);
    return [mm * dot(from, across), mm * dot(from, down), mm * dot(from, away)];
  };
}

/** Depth of a triangle at (x, y); null where that lies outside of it. */
function depthWithin([a, b, c]: readonly Place[], x: number, y: number): number | null {
  const area = (b[0] - a[0]) * (c[1] - a[1]) - (c[0] - a[0]) * (b[1] - a[1]);
  const s = ((x - a[0]) * (c[1] - a[1]) - (c[0] - a[0]) * (y - a[1])) / area;
  const t = ((b[0] - a[0]) * (y - a[1]) - (x - a[0]) * (b[1] - a[1])) / area;
  return s >= 0 && t >= 0 && s + t <= 1 ? a[2] + s * (b[2] - a[2]) + t * (c[2] - a[2]) : null;
}

const dot = (a: Place, b: Place): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
const minus = (a: Place, b: Place): Place => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
const cross = (a: Place, b: Place): Place => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];
const unitOf = (a: Place): Place => a.map((value) => value / Math.hypot(...a)) as unknown as Place;
const middleOf = (places: readonly Place[]): Place =>
  [0, 1, 2].map((axis) => places.reduce((sum, place) => sum + place[axis], 0) / places.length) as unknown as Place;
