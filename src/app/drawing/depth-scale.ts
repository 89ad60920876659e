/*
 * How depth is drawn in plan and section, d positive behind the glass. Three parts, each monotone and without a gap:
 *
 *     u(d) = L (1 + ln(d / L))      d > L         far behind: logarithmic, so that a sky ten metres away still fits the sheet
 *     u(d) = d                      -F <= d <= L  the layers: linear, so that sightlines are straight through the glass
 *     u(d) = -F + r (d + F)         d < -F        the viewers: linear again, shortened by r <= 1
 *
 * The first two meet with equal value and slope. Where the viewers' part is shortened (r < 1), the drawing shows a break line
 * at F, as is usual where a long empty stretch is cut short, and lines bend there.
 */
export interface DepthScale {
  /** Pixels to the millimetre among the layers. */
  readonly pxPerMm: number;
  /** L, mm behind the glass. */
  readonly linearToMm: number;
  /** Left out where the viewers' part is not shortened. */
  readonly broken?: Break;
}

/** Where the way to the viewers is broken off, and what a millimetre beyond counts. */
export interface Break {
  /** F, mm before the glass. */
  readonly atMm: number;
  /** r. */
  readonly beyond: number;
}

type Shape = Omit<DepthScale, 'pxPerMm'>;

const UNBROKEN: Break = { atMm: Infinity, beyond: 1 };

const LINEAR_TO_GLASSES = 1.25;

/** The depth to which a glass of this size is drawn linearly, mm: one and a quarter of its longer side. */
export const linearDepthOf = (glass: { readonly widthMm: number; readonly heightMm: number }) =>
  LINEAR_TO_GLASSES * Math.max(glass.widthMm, glass.heightMm);

/** Depth as it is drawn, still in mm: the identity between the break and `linearToMm`. */
export function drawnDepth(depthMm: number, { linearToMm, broken = UNBROKEN }: Shape): number {
  if (depthMm > linearToMm) return linearToMm * (1 + Math.log(depthMm / linearToMm));
  return depthMm >= -broken.atMm ? depthMm : -broken.atMm + broken.beyond * (depthMm + broken.atMm);
}

/** Pixels from the glass, positive behind it. */
export function depthToPx(scale: DepthScale, depthMm: number): number {
  return scale.pxPerMm * drawnDepth(depthMm, scale);
}

/** The inverse of `depthToPx`. */
export function pxToDepth({ pxPerMm, linearToMm, broken = UNBROKEN }: DepthScale, px: number): number {
  const drawnMm = px / pxPerMm;
  if (drawnMm > linearToMm) return linearToMm * Math.exp(drawnMm / linearToMm - 1);
  return drawnMm >= -broken.atMm ? drawnMm : (drawnMm + broken.atMm) / broken.beyond - broken.atMm;
}

/** Pixels to the millimetre at a depth. */
export function scaleAt({ pxPerMm, linearToMm, broken = UNBROKEN }: DepthScale, depthMm: number): number {
  if (depthMm > linearToMm) return (pxPerMm * linearToMm) / depthMm;
  return depthMm >= -broken.atMm ? pxPerMm : pxPerMm * broken.beyond;
}

const ROUND = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000, 2000, 5000, 10_000] as const;

/** The least round step that is at least `px` pixels at this scale, mm. */
export function roundStep(pxPerMm: number, px: number): number {
  return ROUND.find((step) => step * pxPerMm >= px) ?? ROUND[ROUND.length - 1];
}

/** Depths to print beside the drawing: the glass, and round steps from it to either end. */
export function depthTicks(scale: DepthScale, nearestMm: number, farthestMm: number, leastPx = 44): number[] {
  const away = (endMm: number, pxPerMm: number) => {
    const step = roundStep(pxPerMm, leastPx) * Math.sign(endMm);
    const ticks: number[] = [];
    let last = 0;
    for (let depth = step; Math.abs(depth) <= Math.abs(endMm); depth += step) {
      const px = depthToPx(scale, depth);
      if (Math.abs(px - last) < leastPx * 0.9) continue;
      ticks.push(depth);
      last = px;
    }
    return ticks;
  };
  return [...away(nearestMm, scale.pxPerMm * (scale.broken?.beyond ?? 1)).reverse(), 0, ...away(farthestMm, scale.pxPerMm)];
}
