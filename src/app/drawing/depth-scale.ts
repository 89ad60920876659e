/*
 * How depth is drawn in plan and section. Linear from the viewer to `linearToMm` behind the glass, so that sightlines are
 * straight there; beyond it logarithmic,
 *
 *     u(d) = L (1 + ln(d / L)),   d > L,
 *
 * which meets the linear part with equal value and slope (u(L) = L, u'(L) = 1) and is monotone, so that a sky ten metres
 * away still fits the sheet and can still be dragged.
 */
export interface DepthScale {
  /** Pixels to the millimetre in the linear part. */
  readonly pxPerMm: number;
  readonly linearToMm: number;
}

const LINEAR_TO_GLASSES = 1.25;

/** The depth to which a glass of this size is drawn linearly, mm: one and a quarter of its longer side. */
export const linearDepthOf = (glass: { readonly widthMm: number; readonly heightMm: number }) =>
  LINEAR_TO_GLASSES * Math.max(glass.widthMm, glass.heightMm);

/** Depth as it is drawn, still in mm: the identity up to `linearToMm`. */
export function drawnDepth(depthMm: number, linearToMm: number): number {
  return depthMm <= linearToMm ? depthMm : linearToMm * (1 + Math.log(depthMm / linearToMm));
}

/** Pixels from the glass, positive behind it. */
export function depthToPx(scale: DepthScale, depthMm: number): number {
  return scale.pxPerMm * drawnDepth(depthMm, scale.linearToMm);
}

/** The inverse of `depthToPx`. */
export function pxToDepth(scale: DepthScale, px: number): number {
  const drawnMm = px / scale.pxPerMm;
  return drawnMm <= scale.linearToMm ? drawnMm : scale.linearToMm * Math.exp(drawnMm / scale.linearToMm - 1);
}

const ROUND = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000, 2000, 5000, 10_000] as const;

/** The least round step that is at least `px` pixels at this scale, mm. */
export function roundStep(pxPerMm: number, px: number): number {
  return ROUND.find((step) => step * pxPerMm >= px) ?? ROUND[ROUND.length - 1];
}

/** Depths to print beside the drawing: zero and round steps to either end. */
export function depthTicks(scale: DepthScale, nearestMm: number, farthestMm: number, leastPx = 44): number[] {
  const step = roundStep(scale.pxPerMm, leastPx);
  const ticks: number[] = [];
  let last = -Infinity;
  for (let depth = Math.ceil(nearestMm / step) * step; depth <= farthestMm; depth += step) {
    const px = depthToPx(scale, depth);
    if (px - last < leastPx * 0.9) continue;
    ticks.push(depth === 0 ? 0 : depth);
    last = px;
  }
  return ticks;
}
