import * as fc from 'fast-check';
import { drawnAt, drawnOnGlass, pointedAt } from '../../drawing/placing';
import type { DepthFrame, Frame } from '../../drawing/frames';
import { enlarge, layOutPanes, layOutSheet, type SheetLayout } from './sheet-layout';

const livingRoom = { glass: { widthMm: 1210, heightMm: 681 }, behindMm: 1750, frontMm: 60, beforeMm: 2500 };
const extents = fc.record({
  glass: fc.record({ widthMm: fc.double({ min: 100, max: 4000, noNaN: true }), heightMm: fc.double({ min: 100, max: 4000, noNaN: true }) }),
  behindMm: fc.double({ min: 100, max: 50_000, noNaN: true }),
  frontMm: fc.double({ min: 0, max: 800, noNaN: true }),
  beforeMm: fc.double({ min: 300, max: 9000, noNaN: true }),
});
const rooms = fc.record({ width: fc.integer({ min: 560, max: 3000 }), height: fc.integer({ min: 480, max: 2000 }) });

const within = (inner: Frame, { width, height }: { width: number; height: number }) =>
  inner.left >= 0 && inner.top >= 0 && inner.left + inner.width <= width + 1e-6 && inner.top + inner.height <= height + 1e-6;

const aligned = ({ elevation, plan, section }: SheetLayout) => {
  for (const mm of [-605, 0, 123.4]) {
    expect(drawnAt(plan, { across: mm, z: 700 }).x).toBeCloseTo(drawnOnGlass(elevation, { x: mm, y: 0 }).x, 6);
    expect(drawnAt(section, { across: mm, z: -300 }).y).toBeCloseTo(drawnOnGlass(elevation, { x: 0, y: mm }).y, 6);
  }
};

describe('the sheet', () => {
  it('keeps plan under and section beside the elevation on its own axes, whatever the size', () => {
    fc.assert(
      fc.property(rooms, extents, (room, what) => {
        const layout = layOutSheet(room, what);
        aligned(layout);
        for (const frame of [layout.elevation, layout.plan, layout.section]) expect(within(frame, room)).toBe(true);
        expect(layout.plan.top).toBeGreaterThan(layout.elevation.top + layout.elevation.height);
        expect(layout.section.left).toBeGreaterThan(layout.elevation.left + layout.elevation.width);
      }),
    );
  });

  it('draws behind the glass nearest the elevation in both views: first angle (ISO 128-3, memory)', () => {
    const { elevation, plan, section } = layOutSheet({ width: 1000, height: 780 }, livingRoom);
    const distance = (frame: DepthFrame, z: number) => {
      const at = drawnAt(frame, { across: 0, z });
      return Math.hypot(at.x - elevation.centreX, at.y - elevation.centreY);
    };
    for (const frame of [plan, section]) expect(distance(frame, -1500)).toBeLessThan(distance(frame, 1800));
  });

  it('fits all depths and eyes asked for inside the frames', () => {
    fc.assert(
      fc.property(rooms, extents, (room, what) => {
        const { plan, section } = layOutSheet(room, what);
        expect(drawnAt(plan, { across: 0, z: -what.behindMm }).y).toBeCloseTo(plan.top, 6);
        expect(drawnAt(plan, { across: 0, z: what.beforeMm }).y).toBeCloseTo(plan.top + plan.height, 6);
        expect(drawnAt(section, { across: 0, z: -what.behindMm }).x).toBeCloseTo(section.left, 6);
        expect(drawnAt(section, { across: 0, z: what.beforeMm }).x).toBeCloseTo(section.left + section.width, 6);
      }),
    );
  });

  it('finds the millimetres under a pointer again, enlarged or not', () => {
    fc.assert(
      fc.property(fc.double({ min: -900, max: 900, noNaN: true }), fc.double({ min: -4000, max: 2400, noNaN: true }), fc.double({ min: 0.5, max: 8, noNaN: true }), (across, z, factor) => {
        const layout = enlarge(layOutSheet({ width: 1000, height: 780 }, livingRoom), factor);
        aligned(layout);
        for (const frame of [layout.plan, layout.section]) {
          const found = pointedAt(frame, drawnAt(frame, { across, z }));
          expect(found.across).toBeCloseTo(across, 6);
          expect(found.z).toBeCloseTo(z, 5);
        }
      }),
    );
  });

  it('keeps one x axis for elevation and plan on a phone', () => {
    const { elevation, plan } = layOutPanes({ width: 390, height: 240 }, { width: 390, height: 300 }, livingRoom);
    expect(drawnAt(plan, { across: 605, z: 0 }).x).toBeCloseTo(drawnOnGlass(elevation, { x: 605, y: 0 }).x, 9);
  });
});
