import { anchorsOf, FULL_RANGE, SHORT_RANGE } from './detector-anchors';

describe('anchorsOf', () => {
  it('gives as many anchors as the detectors have outputs: 896 and 2304 (read: shapes in the model files)', () => {
    expect(anchorsOf(SHORT_RANGE)).toHaveLength(2 * 896);
    expect(anchorsOf(FULL_RANGE)).toHaveLength(2 * 2304);
  });

  it('puts two anchors at each of 16 x 16 centres, then six at each of 8 x 8, row by row', () => {
    const anchors = anchorsOf(SHORT_RANGE);
    expect([...anchors.slice(0, 6)]).toEqual([0.5 / 16, 0.5 / 16, 0.5 / 16, 0.5 / 16, 1.5 / 16, 0.5 / 16]);
    expect([...anchors.slice(2 * 512, 2 * 512 + 2)]).toEqual([0.5 / 8, 0.5 / 8]);
    expect([...anchors.slice(-2)]).toEqual([7.5 / 8, 7.5 / 8]);
  });
});
