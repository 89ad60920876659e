import { requiredExtent } from '@oriel/shared/projection/required-extent';
import { layerIds, someScene } from '@oriel/shared/contracts/testing/some-scene';
import { drawLayers } from '../layers/drawn-layer';
import { drawLines, drawSetting, glassNoteY, projectionLines, sightlines } from './depth-drawing';
import { extentsOf } from './extents';
import { drawnAt, pointedAt } from '../../drawing/placing';
import { layOutSheet } from './sheet-layout';

const { plan, section } = layOutSheet({ width: 1000, height: 780 }, extentsOf(someScene));
const layers = drawLayers(someScene);
const eye = { x: -260, y: 120, z: 1500 };

describe('plan and section', () => {
  it('draw each layer as wide as it is in its own plane: 1320 mm on the glass is 1980 mm at 900 mm behind, seen from 1800 mm (computed)', () => {
    const far = drawLines({ ...plan, left: -2000, width: 6000 }, layers, null)[0];
    expect(far.to.x - far.from.x).toBeCloseTo(1980 * plan.pxPerMm, 6);
    expect(far.from.y).toBeCloseTo(drawnAt(plan, { across: 0, z: -900 }).y, 6);
    expect(far.breaks).toEqual([]);
  });

  it('write below the glass, clear of layers that lie just before it', () => {
    const at = (y: number) => ({ from: { x: 0, y }, to: { x: 100, y } });
    expect(glassNoteY(100, [at(60), at(100), at(160)])).toBe(115);
    expect(glassNoteY(100, [at(108)])).toBe(123);
    expect(glassNoteY(100, [at(120), at(108)])).toBe(135);
  });

  it('break off what runs past the drawing', () => {
    const far = drawLines(plan, layers, null)[0];
    expect(far.breaks).toHaveLength(2);
    expect(far.to.x).toBeLessThanOrEqual(plan.left + plan.width);
  });

  it('let the sightline from the worst eye end where the required extent does', () => {
    const needed = requiredExtent(900, someScene.glass, someScene.zone);
    for (const [frame, side, index] of [[plan, 'left', 0], [plan, 'right', 1], [section, 'bottom', 0], [section, 'top', 1]] as const) {
      const points = sightlines(frame, someScene, needed[side].eye)[index].split(' ').map((pair) => {
        const [x, y] = pair.split(',').map(Number);
        return pointedAt(frame, { x, y });
      });
      const atEye = points[0];
      const atGlass = points.find(({ z }) => Math.abs(z) < 2)!;
      const slope = (atGlass.across - atEye.across) / (atGlass.z - atEye.z);
      expect(atGlass.across + slope * -900).toBeCloseTo(needed[side].atMm, -1);
    }
  });

  it('project a layer’s edge onto the glass on a straight line between the edge and the eye', () => {
    for (const frame of [plan, section]) {
      for (const [square, ray] of projectionLines({ ...frame, left: -4000, width: 9000, top: -4000, height: 9000 }, layers[1], eye, null)) {
        const glass = pointedAt(frame, ray.from);
        const edge = pointedAt(frame, ray.to);
        const e = frame.view === 'plan' ? eye.x : eye.y;
        expect(glass.z).toBeCloseTo(0, 6);
        expect(edge.z).toBeCloseTo(-300, 6);
        expect((edge.across - e) / (edge.z - eye.z)).toBeCloseTo((glass.across - e) / (0 - eye.z), 6);
        expect(square.to).toEqual(ray.from);
      }
    }
  });

  it('put the walk within the zone they draw', () => {
    for (const frame of [plan, section]) {
      const { zone, path } = drawSetting(frame, someScene);
      for (const pair of path.split(' ')) {
        const [x, y] = pair.split(',').map(Number);
        expect(x).toBeGreaterThan(zone.left - 0.01);
        expect(x).toBeLessThan(zone.left + zone.width + 0.01);
        expect(y).toBeGreaterThan(zone.top - 0.01);
        expect(y).toBeLessThan(zone.top + zone.height + 0.01);
      }
    }
  });

  it('name the selected layer’s depth', () => {
    const [selected] = drawLines(plan, layers, layerIds[0]).filter((line) => line.selected);
    expect(selected.valueText).toBe('900 mm behind the glass');
    expect(selected.label).not.toBeNull();
  });

  it('print depths with their sign, and the distances of eyes without one', () => {
    const texts = new Map(drawSetting(plan, someScene).ticks.map(({ depthMm, text }) => [depthMm, text]));
    expect(texts.get(0)).toBe('0');
    const far = [...texts.keys()].find((depthMm) => depthMm > 0)!;
    expect(texts.get(far)).toBe(`+${far}`);
    const eyes = [...texts.keys()].filter((depthMm) => -depthMm >= someScene.zone.nearestMm);
    expect(eyes.length).toBeGreaterThan(0);
    for (const depthMm of eyes) expect(texts.get(depthMm)).toBe(String(-depthMm));
  });

  it('name the zone inside of the drawing, however far it runs past it', () => {
    const wide = drawSetting(plan, { ...someScene, zone: { ...someScene.zone, leftMm: -9000, rightMm: 9000, farthestMm: 20_000 } });
    expect(wide.zoneLabel.low.x).toBeGreaterThanOrEqual(plan.left);
    expect(wide.zoneLabel.low.y).toBeLessThanOrEqual(plan.top + plan.height);
  });
});
