import { newWall } from '@oriel/shared/contracts/new-wall';
import { CALM_FOLLOWING } from '@oriel/shared/smoothing/follower-settings';
import { USUAL_VIEWER } from '@oriel/shared/viewer/eye-from-landmarks';
import { devicePxMmOn, followingOn, trackingOn } from './wall-tuning';

const wall = newWall('Hall');

describe('what a wall is tuned to', () => {
  it('is what every player does, until somebody tunes it', () => {
    const { settings, displayDelayMs } = followingOn(wall);
    expect(CALM_FOLLOWING).toMatchObject(settings);
    expect(displayDelayMs).toBe(0);
    expect(trackingOn(wall).viewer).toEqual(USUAL_VIEWER);
  });

  it('reaches follower and tracking figure by figure', () => {
    const tuning = { ...wall.tuning, displayDelayMs: 42, holdMs: 900, scaleFactor: 1.1, ipdMm: { value: 60, uncertainty: 1 } };
    const camera = { ...wall.camera, pitchRad: -0.1, mirrored: true };
    expect(followingOn({ tuning })).toMatchObject({ displayDelayMs: 42, settings: { holdMs: 900 } });
    expect(trackingOn({ camera, tuning })).toEqual({
      camera: { position: camera.position, pitchRad: -0.1, yawRad: 0, rollRad: 0, hfovRad: camera.hfovRad, mirrored: true },
      viewer: { eyeDistanceMm: 60, distanceFactor: 1.1 },
      choice: tuning.choice,
    });
  });

  it('draws to true size by the measured glass, however the screen is turned or scaled', () => {
    const glass = { widthMm: 960, heightMm: 540 };
    expect(devicePxMmOn(glass, { devicePixelRatio: 1, screen: { width: 1920, height: 1080 } })).toBe(0.5);
    expect(devicePxMmOn(glass, { devicePixelRatio: 2, screen: { width: 540, height: 960 } })).toBe(0.5);
  });
});
