import { newId } from '../core/new-id';
import { place, setDepth } from './commands/layer-commands';
import { duplicateLayer, removeLayer } from './commands/stack-commands';
import type { SceneStore } from './scene-store';

/** What a key asks for, and what is said of it where nothing else says it. */
export interface KeyCommand {
  readonly act: () => void;
  readonly says?: string;
}

/**
 * What a key does on the sheet, or null. Arrows move the selected layer on the glass by 1 mm, Page Up and Page Down in depth by 10 mm,
 * ten times that with Shift. Plain keys belong to a field that has the focus; undoing belongs to it only while it is typed in.
 */
export function keyCommand(event: KeyboardEvent, store: SceneStore): KeyCommand | null {
  if (event.altKey) return null;
  return event.ctrlKey || event.metaKey ? withControl(event, store) : plain(event, store);
}

function withControl(event: KeyboardEvent, store: SceneStore): KeyCommand | null {
  if (isTyped(event.target)) return null;
  const key = event.key.toLowerCase();
  if (key === 'y' || (key === 'z' && event.shiftKey)) return { act: () => store.redo(), says: store.canRedo() ? 'Redone' : 'Nothing to redo' };
  if (key === 'z') return { act: () => store.undo(), says: store.canUndo() ? 'Undone' : 'Nothing to undo' };
  const selected = store.selected()?.layer;
  if (key !== 'd' || !selected) return null;
  const copyId = newId();
  const act = () => {
    store.edit(duplicateLayer(selected.id, copyId));
    store.select(copyId);
  };
  return { act, says: `${selected.name} duplicated` };
}

function plain(event: KeyboardEvent, store: SceneStore): KeyCommand | null {
  const selected = store.selected();
  if (!selected || !onSheet(event.target)) return null;
  const { id, name, placed, depthMm } = selected.layer;
  const far = event.shiftKey ? 10 : 1;
  const move = (x: number, y: number) => ({
    act: () => store.edit(place(id, placed.xMm + x * far, placed.yMm + y * far), `place ${id}`),
  });
  const deepen = (mm: number) => ({ act: () => store.edit(setDepth(id, depthMm + mm * far), `depth ${id}`) });
  switch (event.key) {
    case 'ArrowLeft':
      return move(-1, 0);
    case 'ArrowRight':
      return move(1, 0);
    case 'ArrowUp':
      return move(0, 1);
    case 'ArrowDown':
      return move(0, -1);
    case 'PageUp':
      return deepen(10);
    case 'PageDown':
      return deepen(-10);
    case 'Delete':
    case 'Backspace':
      return { act: () => store.edit(removeLayer(id)), says: `${name} removed` };
    case 'Escape':
      return { act: () => store.select(null), says: 'Nothing selected' };
    default:
      return null;
  }
}

const isTyped = (target: EventTarget | null) =>
  target instanceof Element && target.matches('input:not([data-settled], [type=range]), textarea');

/** Plain keys belong to the sheet when it has the focus, or nothing has. */
const onSheet = (target: EventTarget | null) =>
  target === document.body || (target instanceof Element && !target.matches('input') && target.closest('oriel-drawing-sheet') !== null);
