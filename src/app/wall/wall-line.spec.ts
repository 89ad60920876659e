import { type WallSituation, wallLine } from './wall-line';

const well: WallSituation = { wallName: 'Hall', sceneChosen: true, missing: [], tracking: 'following', trackingForMs: 60_000 };

describe('the words on a wall', () => {
  it.each(['following', 'nobody', 'starting', 'off', 'failed'] as const)('are none while tracking is %s: no person is needed', (tracking) => {
    expect(wallLine({ ...well, tracking })).toBeNull();
  });

  it('ask for a scene, a network, a camera', () => {
    expect(wallLine({ ...well, sceneChosen: false })).toContain('Choose a scene');
    expect(wallLine({ ...well, missing: ['Sky', 'Hill'] })).toContain('2 pictures');
    expect(wallLine({ ...well, tracking: 'no-camera' })).toContain('Connect it');
  });

  it('speak of a camera neither at once nor for ever', () => {
    expect(wallLine({ ...well, tracking: 'no-camera', trackingForMs: 5000 })).toBeNull();
    expect(wallLine({ ...well, tracking: 'no-camera', trackingForMs: 300_000 })).toBeNull();
  });
});
