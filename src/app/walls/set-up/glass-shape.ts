import type { WallGlass } from '@oriel/shared/contracts/wall-set-up';

export type Side = 'widthMm' | 'heightMm' | 'widthPx' | 'heightPx';
type Sides = Pick<WallGlass, Side>;

/** The figure that is read together with another. */
const partnerOf: Readonly<Record<Side, Side>> = { widthMm: 'heightMm', heightMm: 'widthMm', widthPx: 'heightPx', heightPx: 'widthPx' };

const names: Readonly<Record<Side, string>> = { widthMm: 'width', heightMm: 'height', widthPx: 'number across', heightPx: 'number down' };

/** A rule is read to a millimetre or two; more than this is a side that was mistaken. */
const sameShape = 0.01;

/** Whether the sides of a glass and its px go together: every screen's px are square (practice). */
export function squarePx({ widthMm, heightMm, widthPx, heightPx }: Sides): boolean {
  return Math.abs((widthMm / widthPx) / (heightMm / heightPx) - 1) <= sameShape;
}

/**
 * How sure the width is once a figure was typed or taken, as a share of it. One side alone is no measure of the glass: it counts as measured
 * once the sides that a rule gave agree with the px. Where no rule was held to it (null), a figure by the others leaves it as sure as it was.
 */
export function ruledUncertainty(glass: WallGlass, ruledMm: number | null): number | null {
  if (ruledMm === null) return glass.uncertainty;
  return squarePx(glass) ? ruledMm / glass.widthMm : null;
}

/** One figure changed, by which sides and px go together again. */
export interface Agreeing {
  readonly words: string;
  readonly part: Partial<WallGlass>;
}

/** What one figure is by the three others, px being square: mm to a tenth, px whole. */
export function sideByOthers({ widthMm, heightMm, widthPx, heightPx }: Sides, side: Side): number {
  const tenth = (mm: number) => Math.round(mm * 10) / 10;
  switch (side) {
    case 'widthMm':
      return tenth((heightMm * widthPx) / heightPx);
    case 'heightMm':
      return tenth((widthMm * heightPx) / widthPx);
    case 'widthPx':
      return Math.round((heightPx * widthMm) / heightMm);
    case 'heightPx':
      return Math.round((widthPx * heightMm) / widthMm);
  }
}

/** Which figures are still to be typed once this one was: the other of its pair, unless that is what was typed before. */
export function awaitedAfter(before: readonly Side[], typed: Side): readonly Side[] {
  if (before.includes(typed)) return before.filter((side) => side !== typed);
  return before.includes(partnerOf[typed]) ? before : [...before, partnerOf[typed]];
}

/** What is asked for while figures are still to be typed. */
export interface Asked {
  readonly words: string;
  /** What it is by the others; null while one of those is still to be typed too. */
  readonly offer: Agreeing | null;
}

export function askFor(glass: Sides, awaited: readonly Side[]): Asked | null {
  if (awaited.length === 0) return null;
  const wanted = awaited.map((side) => `the ${names[side]}`).join(' and ');
  if (awaited.length > 1) return { words: `Now ${wanted}.`, offer: null };
  const [side] = awaited;
  const isMm = side.endsWith('Mm');
  const figure = `${sideByOthers(glass, side)} ${isMm ? 'mm' : 'px'}`;
  return {
    words: `Now ${wanted}. By the ${isMm ? 'pixels' : 'sides'} it is ${figure}.`,
    offer: { words: `Take ${figure}`, part: { [side]: sideByOthers(glass, side) } },
  };
}

/** What may be meant where they do not: the other side as the px have it, or the sides the other way round. */
export function agreeing(glass: Sides): Agreeing[] {
  const { widthMm, heightMm, widthPx, heightPx } = glass;
  const height = sideByOthers(glass, 'heightMm');
  const width = sideByOthers(glass, 'widthMm');
  const turned = squarePx({ ...glass, widthMm: heightMm, heightMm: widthMm });
  return [
    ...(turned ? [{ words: `Exchange the px: ${heightPx} across, ${widthPx} down`, part: { widthPx: heightPx, heightPx: widthPx } }] : []),
    { words: `The height is ${height} mm`, part: { heightMm: height } },
    { words: `The width is ${width} mm`, part: { widthMm: width } },
  ];
}
