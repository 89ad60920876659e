import { newWall } from '@oriel/shared/contracts/new-wall';
import { errorsOf, exampleDepths, meansWords, sourcesOf, together, worthMeasuring, worthWords } from './sources';

const setUp = newWall('Landing');
const measured = { ...setUp, camera: { ...setUp.camera, uncertainty: { hfovRad: 0.0367, pitchRad: 0.005, positionMm: 2 } } };
const sourceOf = (key: string) => sourcesOf(measured).find((source) => source.key === key)!;

describe('what uncertainties mean', () => {
  it('is said in plain words: 0.0367 rad is 2.1 degrees (computed)', () => {
    expect(meansWords(measured, sourceOf('field'))).toMatch(/^±2.1° of view: ±\d\.\d+ mm on the glass for a layer 100 mm behind, ±\d\.\d+ mm for one 500 mm behind\.$/);
  });

  it('says of a measurement what it is worth before it is taken, as it will be said after', () => {
    const taken = meansWords(measured, sourceOf('field'));
    expect(worthWords(measured, { hfovRad: 0.0367 })).toBe(`That is ${taken.slice(taken.indexOf(': ') + 2)}`);
  });

  it('says so of what nobody measured', () => {
    expect(meansWords(setUp, sourcesOf(setUp)[3])).toMatch(/^Not measured. Taken as ±5° of view: /);
  });

  it('moves a layer by d/(z + d) for each mm of the lens (by hand: two axes of 2 mm, z = 2200; distance adds little)', () => {
    const [near] = errorsOf(measured, sourceOf('position').unsure)!;
    const sideways = (2 * Math.SQRT2 * 100) / 2300;
    expect(near).toBeGreaterThan(sideways);
    expect(near).toBeLessThan(sideways * 1.1);
  });

  it('adds up in squares', () => {
    const sources = sourcesOf(measured);
    const each = sources.map((source) => errorsOf(measured, source.unsure)![1]);
    const [, all] = errorsOf(measured, together(sources))!;
    expect(all).toBeLessThanOrEqual(Math.hypot(...each) + 1e-9);
    expect(all).toBeGreaterThan(Math.max(...each));
    expect(exampleDepths).toHaveLength(2);
  });

  it('says what is worth measuring next: of a new wall the turn, then what is left, then nothing', () => {
    expect(worthMeasuring(setUp)).toBe('What is only assumed and counts most is the turn of the camera: measure it in the step Camera.');
    expect(worthMeasuring(measured)).toBe('What is only assumed and counts most is the size of the viewer: measure it in the step Viewer.');
    const { ipdMm } = setUp.tuning;
    expect(worthMeasuring({ ...measured, glass: { ...setUp.glass, uncertainty: 0.001 }, tuning: { ...setUp.tuning, ipdMm: { ...ipdMm, uncertainty: 1 } } })).toBe('');
  });

  it('asks to turn a camera that looks away', () => {
    const away = { ...measured, camera: { ...measured.camera, yawRad: 3 } };
    expect(meansWords(away, sourceOf('field'))).toContain('turn it there');
  });
});
