import { TestBed } from '@angular/core/testing';
import { setDepth } from './commands/layer-commands';
import { layerIds, someScene } from '@oriel/shared/contracts/testing/some-scene';
import { keyCommand } from './key-commands';
import { SceneStore } from './scene-store';

describe('the store of a scene', () => {
  let store: SceneStore;
  const depth = () => store.document().layers[0].depthMm;
  beforeEach(() => {
    store = TestBed.configureTestingModule({ providers: [SceneStore] }).inject(SceneStore);
    store.open(someScene);
  });

  it('makes one step of a drag, and none of a drag taken back', () => {
    const drag = store.gesture();
    for (const mm of [910, 920, 930]) drag.edit(setDepth(layerIds[0], mm));
    expect(store.gesturing()).toBe(true);
    drag.end();
    store.undo();
    expect(depth()).toBe(900);
    store.redo();
    expect(depth()).toBe(930);
    const second = store.gesture();
    second.edit(setDepth(layerIds[0], 5));
    second.cancel();
    expect(depth()).toBe(930);
    expect(store.gesturing()).toBe(false);
  });

  it('does not join two drags that follow each other', () => {
    for (const mm of [100, 200]) {
      const drag = store.gesture();
      drag.edit(setDepth(layerIds[0], mm));
      drag.end();
    }
    store.undo();
    expect(depth()).toBe(100);
  });

  it('changes nothing for those who may only look', () => {
    store.readOnly.set(true);
    store.edit(setDepth(layerIds[0], 5));
    const drag = store.gesture();
    drag.edit(setDepth(layerIds[0], 5));
    drag.end();
    expect(store.document()).toBe(someScene);
    expect(store.canUndo()).toBe(false);
  });

  it('forgets a selection whose layer is gone, and finds it again when that is undone', () => {
    store.select(layerIds[0]);
    store.edit((document) => ({ ...document, layers: document.layers.slice(1) }));
    expect(store.selectedId()).toBeNull();
    store.undo();
    expect(store.selectedId()).toBe(layerIds[0]);
  });

  it('lists the farthest first', () => {
    store.edit(setDepth(layerIds[1], 2000));
    expect(store.ledger().map(({ layer }) => layer.name)).toEqual(['Larches', 'Sky', 'Meadow']);
  });

  it('takes keys for the selected layer, unless a field is typed in', () => {
    const press = (key: string, more: KeyboardEventInit = {}, target: Element = document.body) => {
      const event = new KeyboardEvent('keydown', { key, bubbles: true, ...more });
      target.dispatchEvent(event);
      keyCommand(event, store)?.act();
    };
    press('PageUp');
    expect(store.document()).toBe(someScene);
    store.select(layerIds[0]);
    press('PageUp');
    press('PageDown', { shiftKey: true });
    expect(depth()).toBe(810);
    press('ArrowRight', { shiftKey: true });
    expect(store.selected()?.layer.placed.xMm).toBe(10);
    const field = document.body.appendChild(document.createElement('input'));
    press('z', { ctrlKey: true }, field);
    press('Delete', {}, field);
    expect(store.document().layers).toHaveLength(3);
    expect(store.selected()?.layer.placed.xMm).toBe(10);
    field.remove();
    press('z', { ctrlKey: true });
    press('z', { ctrlKey: true });
    expect(store.document()).toBe(someScene);
    press('d', { ctrlKey: true });
    expect(store.selected()?.layer.name).toBe('Sky copy');
    press('Delete');
    expect(store.document().layers).toHaveLength(3);
  });
});
