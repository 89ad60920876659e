import type { TrackingState } from '../tracking/tracking-state';
import { type CameraLack, type WallSituation, lackAfter, wallLine } from './wall-line';

const well: WallSituation = { wallName: 'Hall', sceneChosen: true, missing: [], lack: null, nowMs: 100_000 };
const lacking = (state: TrackingState, forMs: number): WallSituation => ({ ...well, lack: { state, sinceMs: well.nowMs - forMs } });

describe('the words on a wall', () => {
  it('are none while all is well', () => {
    expect(wallLine(well)).toBeNull();
  });

  it('ask for a scene, a network, a camera', () => {
    expect(wallLine({ ...well, sceneChosen: false })).toContain('Choose a scene');
    expect(wallLine({ ...well, missing: ['Sky', 'Hill'] })).toContain('2 pictures');
    expect(wallLine(lacking('no-camera', 60_000))).toContain('Connect it');
  });

  it('speak of a camera neither at once nor for ever', () => {
    expect(wallLine(lacking('no-camera', 5000))).toBeNull();
    expect(wallLine(lacking('no-camera', 300_000))).toBeNull();
  });
});

describe('what keeps the camera from a wall', () => {
  /** Each state and when it began, in turn. */
  const after = (...states: readonly [TrackingState, number][]) => states.reduce<CameraLack | null>((before, [state, ms]) => lackAfter(before, state, ms), null);

  it.each(['following', 'nobody', 'starting', 'off', 'failed'] as const)('is nothing while tracking is %s: no person is needed', (state) => {
    expect(after(['no-camera', 0], [state, 1000])).toBeNull();
  });

  it('lasts while the camera is asked for again and again, every five seconds', () => {
    expect(after(['asking', 0], ['no-camera', 100], ['asking', 5100], ['no-camera', 5200], ['asking', 10_200])).toEqual({ state: 'no-camera', sinceMs: 100 });
  });

  it('begins anew with another reason', () => {
    expect(after(['no-camera', 0], ['asking', 5000], ['camera-busy', 5100])).toEqual({ state: 'camera-busy', sinceMs: 5100 });
  });
});
