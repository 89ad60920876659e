import * as fc from 'fast-check';
import { SceneDocument } from '@oriel/shared/contracts/scenes';
import { layerIds, someScene } from '@oriel/shared/contracts/testing/some-scene';
import { clearance } from '@oriel/shared/projection/clearance';
import { onGlassFrom, planeFromHome } from '@oriel/shared/projection/home-plane';
import { beginHistory, MOST_STEPS, record, redo, undo } from '../history';
import type { Change } from './change';
import { hideLayer, place, renameLayer, setDepth, setOpacity, setWidth, showLayer } from './layer-commands';
import { creditScene, growLayersToCover, renameScene, scaleToGlass, setGlass, setHomeEye, setZone } from './setting-commands';
import { addLayer, duplicateLayer, removeLayer, reorderLayer } from './stack-commands';

const id = fc.constantFrom(...layerIds);
const mm = fc.double({ min: -20_000, max: 20_000, noNaN: true });
const size = fc.double({ min: -10, max: 9000, noNaN: true });
const glass = fc.record({ widthMm: fc.double({ min: 50, max: 5000, noNaN: true }), heightMm: fc.double({ min: 50, max: 5000, noNaN: true }) });
const image = { id: layerIds[0], width: 400, height: 300, trim: { left: 100, top: 50, ofWidth: 1600, ofHeight: 900 } };

const anyChange: fc.Arbitrary<Change> = fc.oneof(
  fc.tuple(id, mm).map((a) => setDepth(...a)),
  fc.tuple(id, mm, mm).map((a) => place(...a)),
  fc.tuple(id, size).map((a) => setWidth(...a)),
  fc.tuple(id, fc.string()).map((a) => renameLayer(...a)),
  fc.tuple(id, fc.double({ min: -1, max: 2, noNaN: true })).map((a) => setOpacity(...a)),
  id.map(showLayer),
  id.map(hideLayer),
  fc.tuple(id, fc.uuid()).map((a) => duplicateLayer(...a)),
  id.map(removeLayer),
  fc.tuple(id, fc.integer({ min: -3, max: 3 })).map((a) => reorderLayer(...a)),
  fc.uuid().map((newId) => addLayer(newId, 'Spruce', image)),
  glass.map(setGlass),
  fc.record({ x: mm, y: mm, z: mm }).map(setHomeEye),
  fc.record({ leftMm: mm, rightMm: mm, lowestMm: mm, highestMm: mm, nearestMm: mm, farthestMm: mm }, { requiredKeys: [] }).map(setZone),
  fc.string().map(renameScene),
  fc.string({ maxLength: 300 }).map(creditScene),
  fc.constant(growLayersToCover),
);

describe('commands', () => {
  it('always leave a scene that can be saved', () => {
    fc.assert(
      fc.property(fc.array(anyChange, { maxLength: 30 }), (changes) => {
        const after = changes.reduce((document, change) => change(document), someScene);
        expect(SceneDocument.safeParse(after).error).toBeUndefined();
        expect(() => clearance(after)).not.toThrow();
      }),
    );
  });

  it('are undone and redone exactly, in any mixture', () => {
    fc.assert(
      fc.property(fc.array(fc.oneof(anyChange, fc.constant('undo' as const), fc.constant('redo' as const)), { maxLength: 40 }), (steps) => {
        let history = beginHistory(someScene);
        const model = { states: [someScene], at: 0 };
        for (const step of steps) {
          if (step === 'undo') {
            history = undo(history);
            model.at = Math.max(0, model.at - 1);
          } else if (step === 'redo') {
            history = redo(history);
            model.at = Math.min(model.states.length - 1, model.at + 1);
          } else {
            const next = step(history.present);
            history = record(history, next);
            if (next !== model.states[model.at]) {
              model.states = [...model.states.slice(0, model.at + 1), next];
              model.at += 1;
            }
          }
          expect(history.present).toBe(model.states[model.at]);
        }
      }),
    );
  });

  it('change no layer’s picture from the home eye with its depth', () => {
    fc.assert(
      fc.property(id, mm, (which, depthMm) => {
        const after = setDepth(which, depthMm)(someScene);
        const layer = after.layers.find((candidate) => candidate.id === which)!;
        const before = someScene.layers.find((candidate) => candidate.id === which)!;
        const seen = onGlassFrom(planeFromHome(layer.placed, after.homeEye, layer.depthMm), after.homeEye, layer.depthMm);
        expect(seen.xMm).toBeCloseTo(before.placed.xMm, 6);
        expect(seen.yMm).toBeCloseTo(before.placed.yMm, 6);
        expect(seen.widthMm).toBeCloseTo(before.placed.widthMm, 6);
      }),
    );
  });

  it('join the steps of one drag, and typing only while it is quick', () => {
    let history = beginHistory(someScene);
    for (const depth of [10, 20, 30]) history = record(history, setDepth(layerIds[0], depth)(history.present), { key: 'drag 1', at: depth * 1000 });
    expect(history.past).toHaveLength(1);
    history = record(history, setDepth(layerIds[0], 40)(history.present), { key: 'typing', at: 40_000 }, 800);
    history = record(history, setDepth(layerIds[0], 41)(history.present), { key: 'typing', at: 40_500 }, 800);
    history = record(history, setDepth(layerIds[0], 42)(history.present), { key: 'typing', at: 42_000 }, 800);
    expect(history.past).toHaveLength(3);
    expect(undo(undo(undo(history))).present).toBe(someScene);
  });

  it('keep no more steps than they must', () => {
    let history = beginHistory(someScene);
    for (let depth = 1; depth < MOST_STEPS + 50; depth += 1) history = record(history, setDepth(layerIds[0], depth)(history.present));
    expect(history.past).toHaveLength(MOST_STEPS);
  });

  it('cut no character in half where a name is too long', () => {
    const long = `${'x'.repeat(114)}\u{1f33e}\u{1f33e}\u{1f33e}`;
    const copied = duplicateLayer(layerIds[0], 'copy')(renameLayer(layerIds[0], long)(someScene));
    const names = copied.layers.map(({ name }) => name);
    expect(names).toContain(`${'x'.repeat(114)} copy`);
    for (const name of names) expect(name).not.toMatch(/\p{Cs}/u);
  });

  it('grow the scene until it is clear', () => {
    const grown = growLayersToCover({ ...someScene, layers: someScene.layers.slice(0, 2) });
    expect(clearance({ ...someScene, layers: someScene.layers.slice(0, 2) })).not.toEqual([]);
    expect(clearance(grown)).toEqual([]);
  });

  it('keep every angle when the scene is carried to another glass: half the glass, half of everything (computed)', () => {
    const half = scaleToGlass({ widthMm: 600, heightMm: 337.5 })(someScene);
    expect(half.homeEye.z).toBe(900);
    expect(half.zone.rightMm).toBe(300);
    expect(half.layers[0].depthMm).toBe(450);
    expect(half.layers[0].placed.widthMm).toBe(660);
  });
});
