import { depthToPx, roundStep, scaleAt, type DepthScale } from '../../drawing/depth-scale';

/** A snap should be felt but not fought: its steps are at least this wide on the sheet, px. */
const STEP_PX = 1.5;
/** The glass draws a layer to itself from this near, px. */
const GLASS_PX = 3;

/** The round depth nearest to where the pointer is, and the glass itself when it is close. */
export function snapToRound(depthMm: number, scale: DepthScale): number {
  if (Math.abs(depthToPx(scale, depthMm)) < GLASS_PX && Math.abs(depthMm) < roundStep(scale.pxPerMm, STEP_PX)) return 0;
  const step = roundStep(scaleAt(scale, depthMm), STEP_PX);
  return Math.round(depthMm / step) * step + 0;
}

/** Without snapping: whole millimetres. */
export const toMillimetre = (mm: number) => Math.round(mm) + 0;
