import { newWall } from '@oriel/shared/contracts/new-wall';
import { stepsDone } from './steps';

describe('the steps of a set-up', () => {
  const setUp = newWall('Landing');

  it('are all to be done on a new wall', () => {
    expect(Object.values(stepsDone(setUp, null))).toEqual(Array(6).fill(false));
  });

  it('are done one by one, as what is assumed is measured', () => {
    const measured = { ...setUp, glass: { ...setUp.glass, uncertainty: 0.001 }, camera: { ...setUp.camera, uncertainty: { hfovRad: 0.01, pitchRad: 0.005, positionMm: 3 } } };
    expect(stepsDone(measured, '2026-03-14T17:05:00.000Z')).toEqual({ glass: true, camera: true, room: true, viewer: false, scene: false, pair: true });
    expect(stepsDone({ ...measured, zone: { ...measured.zone, lowestMm: -1500 } }, null).room).toBe(false);
  });
});
