import { type ScreenFacts, ScreenSetUp, cameraPosition, isOfThisScreen, setUpOf, usualSetUp } from './screen-set-up';
import { trackingSetUp } from './tracking-set-up';

const facts: ScreenFacts = { screen: { width: 1920, height: 1080 }, devicePixelRatio: 1.5 };

describe('the set-up of a screen', () => {
  it('is valid with the usual measures, and survives being kept', () => {
    const usual = usualSetUp(facts);
    expect(ScreenSetUp.parse(JSON.parse(JSON.stringify(usual)))).toEqual(usual);
    expect(usual.measured).toBe(false);
    expect(usual.glass.widthMm).toBeCloseTo(508, 9);
  });

  it('keeps the size of a device pixel, which zooming does not change', () => {
    expect(setUpOf(facts, 0.3, true).devicePxMm).toBeCloseTo(0.2, 9);
  });

  it('holds for the screen it was made on, upright or turned, and for no other', () => {
    const made = usualSetUp(facts);
    expect(isOfThisScreen(made, facts)).toBe(true);
    expect(isOfThisScreen(made, { ...facts, screen: { width: 1080, height: 1920 } })).toBe(true);
    expect(isOfThisScreen(made, { ...facts, screen: { width: 1440, height: 900 } })).toBe(false);
  });

  it.each([
    ['above', { x: 0, y: 160, z: 0 }],
    ['below', { x: 0, y: -160, z: 0 }],
    ['left', { x: -250, y: 0, z: 0 }],
    ['right', { x: 250, y: 0, z: 0 }],
  ] as const)('puts a camera %s outside the middle of that edge', (side, place) => {
    const { camera } = usualSetUp(facts);
    expect(cameraPosition({ glass: { widthMm: 480, heightMm: 300 }, camera: { ...camera, side, offsetMm: 10 } })).toEqual(place);
  });

  it('tells the tracking that a camera turned down looks below the horizontal', () => {
    const made = usualSetUp(facts);
    const { camera } = trackingSetUp({ ...made, camera: { ...made.camera, downDegrees: 8 } });
    expect(camera.pitchRad).toBeCloseTo(-0.139626, 6);
    expect(camera.hfovRad).toBeCloseTo(Math.PI / 3, 9);
  });

  it('refuses what cannot be, in words', () => {
    const made = usualSetUp(facts);
    const parsed = ScreenSetUp.safeParse({ ...made, camera: { ...made.camera, fieldDegrees: 200 } });
    expect(parsed.error?.issues[0].message).toBe('At most 140 degrees');
  });
});
