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

  it('goes a fifth of the way a frame within 3 % of its size, a twentieth of a change of size, and all of it beyond', () => {
    const prediction = new RegionPrediction(at(0), 0);
    prediction.measure(at(1, 102), 1000);
    expect(prediction.at(1033).cx).toBeCloseTo(0.2, 9);
    expect(prediction.at(1033).size).toBeCloseTo(100.195, 9);
    prediction.measure(at(1, 110), 2000);
    expect(prediction.at(2033)).toEqual(at(1, 110));
  });

  it('carries a steady approach on exactly, once its growth has settled, but no bound', () => {
    const prediction = new RegionPrediction(at(0), 0);
    for (let frame = 1; frame <= 12; frame++) prediction.measure(at(0, 100 * 1.05 ** frame), 33 * frame);
    expect(prediction.at(33 * 13).size).toBeCloseTo(100 * 1.05 ** 13, 1);
    prediction.measure(at(0, 300), 33 * 13);
    expect(prediction.at(33 * 14).size).toBe(300);
  });

  it('believes less of the size while the face moves fast: a smear is wider than the face', () => {
    const prediction = new RegionPrediction(at(0), 0);
    prediction.measure(at(30, 120), 33);
    expect(prediction.fast).toBe(true);
    expect(prediction.latest.size).toBeCloseTo(100 * 1.2 ** 0.3, 9);
    prediction.measure(at(32, 120), 66);
    prediction.measure(at(32, 120), 99);
    expect(prediction.fast).toBe(false);
    expect(prediction.latest.size).toBe(120);
  });

  it('forgets the velocity over a long gap', () => {
    const prediction = new RegionPrediction(at(0), 0);
    prediction.measure(at(50), 33);
    prediction.measure(at(60), 2000);
    expect(prediction.at(2033).cx).toBe(60);
  });
});
