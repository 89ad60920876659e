import type { Point3, ViewingZone } from '@oriel/shared/projection/types';

/** A true minus sign: as wide as a plus, so columns of figures stay in line. */
const MINUS = '\u2212';

/** A figure of mm with at most one decimal. */
export function plainMm(value: number, decimals = 1): string {
  const text = rounded(Math.abs(value), decimals);
  return value < 0 && Number(text) !== 0 ? MINUS + text : text;
}

/** A depth or a bleed: always with its sign. */
export function signedMm(value: number, decimals = 1): string {
  const text = plainMm(value, decimals);
  return Number(text) > 0 ? `+${text}` : text;
}

const rounded = (value: number, decimals: number) => String(Number(value.toFixed(decimals)));

/** 1,500: a thousand and a half to some, one and a half to others. */
const AMBIGUOUS = /^\D?[1-9]\d{0,2}(,\d{3})+$/;

/** Reads a figure as people type it: either minus sign, a decimal comma, a trailing unit; null where it is none, or could be two. */
export function readFigure(text: string): number | null {
  const bare = text.trim().replace(/\s*(mm|cm|in|%|px|°)$/i, '');
  if (AMBIGUOUS.test(bare)) return null;
  const plain = bare.replace(/[\u2212\u2013]/g, '-').replace(',', '.').replace(/^\+/, '');
  if (!/^-?(\d+\.?\d*|\.\d+)$/.test(plain)) return null;
  return Number(plain);
}

/** Whole figures near: "180 mm behind the glass". */
export function describeDepth(depthMm: number): string {
  const text = plainMm(Math.abs(depthMm));
  if (Number(text) === 0) return 'on the glass';
  return `${text} mm ${depthMm > 0 ? 'behind' : 'in front of'} the glass`;
}

/** "260 mm left, 120 mm up, 1500 mm away", leaving out what is zero. */
export function describeEye({ x, y, z }: Point3): string {
  const side = (value: number, positive: string, negative: string) =>
    Math.round(value) === 0 ? [] : [`${Math.abs(Math.round(value))} mm ${value > 0 ? positive : negative}`];
  return [...side(x, 'right', 'left'), ...side(y, 'up', 'down'), `${Math.round(z)} mm away`].join(', ');
}

/** What the sides of a viewing zone are called where they are typed. */
export const zoneSideWords: Readonly<Record<keyof ViewingZone, string>> = {
  leftMm: 'Left end',
  rightMm: 'Right end',
  lowestMm: 'Lowest eye',
  highestMm: 'Highest eye',
  nearestMm: 'Nearest',
  farthestMm: 'Farthest',
};
