import { drawnAt } from '../../drawing/placing';
import { layOutRoom, stackRoom } from './room-layout';

const extents = { left: -800, right: 1000, below: -400, above: 500, before: 3400 };

describe('the drawing of a wall', () => {
  it('keeps one scale and its axes: the plan under the elevation, the section beside it', () => {
    const { elevation, plan, section, pxPerMm } = layOutRoom({ width: 900, height: 720 }, extents);
    expect([elevation?.pxPerMm, plan.pxPerMm, section.pxPerMm, plan.depth.pxPerMm]).toEqual(Array(4).fill(pxPerMm));
    expect(plan.centre).toBe(elevation?.centreX);
    expect(section.centre).toBe(elevation?.centreY);
    expect(plan.top).toBeGreaterThan(elevation!.top + elevation!.height);
    expect(section.left).toBeGreaterThan(elevation!.left + elevation!.width);
  });

  it.each([
    ['wide', layOutRoom({ width: 900, height: 720 }, extents)],
    ['tall', layOutRoom({ width: 500, height: 900 }, extents)],
    ['narrow', stackRoom(340, extents)],
  ])('fits whole on a %s sheet', (_, layout) => {
    for (const frame of [layout.plan, layout.section]) {
      expect(frame.left).toBeGreaterThanOrEqual(0);
      expect(frame.left + frame.width).toBeLessThanOrEqual(layout.width + 0.01);
      expect(frame.top + frame.height).toBeLessThanOrEqual(layout.height + 0.01);
      const [low, high] = frame.view === 'plan' ? [extents.left, extents.right] : [extents.below, extents.above];
      for (const across of [low, high]) {
        const { x, y } = drawnAt(frame, { across, z: extents.before });
        expect(x).toBeGreaterThanOrEqual(frame.left - 0.01);
        expect(x).toBeLessThanOrEqual(frame.left + frame.width + 0.01);
        expect(y).toBeGreaterThanOrEqual(frame.top - 0.01);
        expect(y).toBeLessThanOrEqual(frame.top + frame.height + 0.01);
      }
    }
  });
});
