import { askForShortExposure } from './short-exposure';

describe('askForShortExposure', () => {
  const trackThat = (capabilities: object, answer: () => Promise<void>) => {
    const applyConstraints = vi.fn(answer);
    const track = { getCapabilities: () => capabilities, applyConstraints } as unknown as MediaStreamTrack;
    return { track, applyConstraints };
  };

  it('asks for a stop less, or as little as the camera goes', async () => {
    const { track, applyConstraints } = trackThat({ exposureCompensation: { min: -3, max: 3 } }, () => Promise.resolve());
    await askForShortExposure(track);
    expect(applyConstraints).toHaveBeenCalledWith({ advanced: [{ exposureCompensation: -1 }] });
    const timid = trackThat({ exposureCompensation: { min: -0.5, max: 3 } }, () => Promise.resolve());
    await askForShortExposure(timid.track);
    expect(timid.applyConstraints).toHaveBeenCalledWith({ advanced: [{ exposureCompensation: -0.5 }] });
  });

  it('leaves a camera alone that cannot, and takes a refusal calmly', async () => {
    const { track, applyConstraints } = trackThat({}, () => Promise.resolve());
    await askForShortExposure(track);
    expect(applyConstraints).not.toHaveBeenCalled();
    const refusing = trackThat({ exposureCompensation: { min: -3, max: 3 } }, () => Promise.reject(new Error('no')));
    await expect(askForShortExposure(refusing.track)).resolves.toBeUndefined();
    await expect(askForShortExposure({} as MediaStreamTrack)).resolves.toBeUndefined();
  });
});
