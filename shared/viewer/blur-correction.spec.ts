import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { figure } from '../projection/testing/arbitraries';
import { correctionForBlur, createBlurCorrection, type SeenFace } from './blur-correction';

const FRAME_MS = 1000 / 30;
const EYES_PX = 30;

interface Moving {
  readonly pxAFrame: number;
  readonly widening: number;
  readonly detail: number;
  readonly directionRad?: number;
}

/** What the second frame of such a face is corrected by. */
function correction({ pxAFrame, widening, detail, directionRad = 0 }: Moving, gapMs = FRAME_MS): number {
  const state = createBlurCorrection();
  const seen = (k: number): SeenFace => ({
    tMs: k * gapMs,
    xPx: 300 + k * pxAFrame * Math.cos(directionRad),
    yPx: 200 + k * pxAFrame * Math.sin(directionRad),
    eyeDistancePx: EYES_PX,
    eyeLineRad: 0,
    widening: () => widening,
    detailAlong: () => detail,
  });
  correctionForBlur(state, seen(0));
  return correctionForBlur(state, seen(1));
}

describe('correctionForBlur', () => {
  it('takes back what a smear that makes a face 1.3 as wide takes: 0.5 x 0.2 of the distance (computed)', () => {
    expect(correction({ pxAFrame: 15, widening: 1.3, detail: 0.5 })).toBeCloseTo(1 / 0.9, 9);
  });

  it('leaves a face alone that hardly moves, that is sharp, or that is no wider than a sharp one', () => {
    expect(correction({ pxAFrame: 3, widening: 1.3, detail: 0.5 })).toBe(1);
    expect(correction({ pxAFrame: 15, widening: 1.3, detail: 0.8 })).toBe(1);
    expect(correction({ pxAFrame: 15, widening: 1.08, detail: 0.5 })).toBe(1);
  });

  it('leaves a face alone that nods', () => {
    expect(correction({ pxAFrame: 15, widening: 1.3, detail: 0.5, directionRad: Math.PI / 2 })).toBe(1);
  });

  it('trusts the smear alone where nothing is known of speed: another face, or one not seen a moment ago', () => {
    const way = Math.PI / 2;
    expect(correction({ pxAFrame: 60, widening: 1.3, detail: 0.5, directionRad: way })).toBeCloseTo(1 / 0.9, 9);
    expect(correction({ pxAFrame: 0, widening: 1.3, detail: 0.5 }, 400)).toBeCloseTo(1 / 0.9, 9);
    expect(correction({ pxAFrame: 0, widening: 1.3, detail: 0.8 }, 400)).toBe(1);
  });

  it('is never less than 1 nor more than blur was ever seen to do, a quarter of the distance', () => {
    fc.assert(
      fc.property(figure(0, 60), figure(0.5, 3), figure(0, 2), figure(-3, 3), (pxAFrame, widening, detail, directionRad) => {
        const by = correction({ pxAFrame, widening, detail, directionRad });
        expect(by).toBeGreaterThanOrEqual(1);
        expect(by).toBeLessThanOrEqual(4 / 3 + 1e-9);
      }),
    );
  });
});
