import type { Region } from './region';
import { RegionPrediction } from './region-prediction';

const at = (cx: number, size = 100): Region => ({ cx, cy: 0, size, angleRad: 0 });

describe('RegionPrediction', () => {
  it('carries a steady walk on exactly, once its velocity has settled', () => {
    const prediction = new RegionPrediction(at(0), 0);
    for (let frame = 1; frame <= 12; frame++) prediction.measure(at(10 * frame), 33 * frame);
    expect(prediction.at(33 * 13).cx).toBeCloseTo(130, 3);
  });

  it('believes 0.7 of the newest velocity and 0.3 of the one before', () => {
    const prediction = new RegionPrediction(at(0), 0);
    prediction.measure(at(10), 10);
    expect(prediction.at(20).cx).toBeCloseTo(10 + 0.7 * 10, 12);
    prediction.measure(at(10), 20);
    expect(prediction.at(30).cx).toBeCloseTo(10 + 0.3 * 7, 12);
  });

  it('does not move at all within 3 % of its size', () => {
    const prediction = new RegionPrediction(at(0), 0);
    const first = prediction.at(33);
    prediction.measure(at(1.5), 33);
    expect(prediction.at(66)).toBe(first);
    prediction.measure(at(4), 66);
    expect(prediction.at(99)).not.toBe(first);
  });

  it('forgets the velocity over a long gap', () => {
    const prediction = new RegionPrediction(at(0), 0);
    prediction.measure(at(50), 33);
    prediction.measure(at(60), 2000);
    expect(prediction.at(2033).cx).toBe(60);
  });
});
