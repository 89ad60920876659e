import { place, setDepth } from './commands/layer-commands';
import { duplicateLayer, removeLayer } from './commands/stack-commands';
import type { SceneStore } from './scene-store';

/**
 * What a key does on the sheet, or null. Undoing is left to a text field while one is typed in; so are all plain keys.
 * Arrows move the selected layer on the glass by 1 mm and Page Up and Page Down in depth by 10 mm, ten times that with Shift.
 */
export function keyCommand(event: KeyboardEvent, typing: boolean, store: SceneStore): (() => void) | null {
  if (typing || event.altKey) return null;
  return event.ctrlKey || event.metaKey ? withControl(event, store) : plain(event, store);
}

function withControl(event: KeyboardEvent, store: SceneStore): (() => void) | null {
  const key = event.key.toLowerCase();
  if (key === 'z') return event.shiftKey ? () => store.redo() : () => store.undo();
  if (key === 'y') return () => store.redo();
  const selected = store.selectedId();
  if (key !== 'd' || !selected) return null;
  return () => {
    const copyId = crypto.randomUUID();
    store.edit(duplicateLayer(selected, copyId));
    store.select(copyId);
  };
}

function plain(event: KeyboardEvent, store: SceneStore): (() => void) | null {
  const selected = store.selected();
  if (!selected || !onSheet(event.target)) return null;
  const { id, placed, depthMm } = selected.layer;
  const far = event.shiftKey ? 10 : 1;
  const move = (x: number, y: number) => () => store.edit(place(id, placed.xMm + x * far, placed.yMm + y * far), `place ${id}`);
  const deepen = (mm: number) => () => store.edit(setDepth(id, depthMm + mm * far), `depth ${id}`);
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
      return () => store.edit(removeLayer(id));
    case 'Escape':
      return () => store.select(null);
    default:
      return null;
  }
}

/** Keys belong to the sheet when nothing has the focus, or something on the sheet. */
const onSheet = (target: EventTarget | null) =>
  target === document.body || (target instanceof Element && target.closest('oriel-drawing-sheet, #content') !== null && !target.closest('oriel-ledger button, [role=menu]'));
