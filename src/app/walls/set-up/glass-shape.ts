import type { WallGlass } from '@oriel/shared/contracts/wall-set-up';

type Sides = Pick<WallGlass, 'widthMm' | 'heightMm' | 'widthPx' | 'heightPx'>;

/** A rule is read to a millimetre or two; more than this is a side that was mistaken. */
const sameShape = 0.01;

/** Whether the sides of a glass and its px go together: every screen's px are square (practice). */
export function squarePx({ widthMm, heightMm, widthPx, heightPx }: Sides): boolean {
  return Math.abs((widthMm / widthPx) / (heightMm / heightPx) - 1) <= sameShape;
}

/** One figure changed, by which sides and px go together again. */
export interface Agreeing {
  readonly words: string;
  readonly part: Partial<WallGlass>;
}

/** What may be meant where they do not: the other side as the px have it, or the sides the other way round. */
export function agreeing(glass: Sides): Agreeing[] {
  const { widthMm, heightMm, widthPx, heightPx } = glass;
  const tenth = (mm: number) => Math.round(mm * 10) / 10;
  const height = tenth((widthMm * heightPx) / widthPx);
  const width = tenth((heightMm * widthPx) / heightPx);
  const turned = squarePx({ ...glass, widthMm: heightMm, heightMm: widthMm });
  return [
    ...(turned ? [{ words: `Exchange the px: ${heightPx} across, ${widthPx} down`, part: { widthPx: heightPx, heightPx: widthPx } }] : []),
    { words: `The height is ${height} mm`, part: { heightMm: height } },
    { words: `The width is ${width} mm`, part: { widthMm: width } },
  ];
}
