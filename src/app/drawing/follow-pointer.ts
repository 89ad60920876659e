export interface Following {
  move(event: PointerEvent): void;
  /** Let go; `moved` says whether it was a drag rather than a press. */
  end(moved: boolean): void;
  /** Escape, or the pointer was taken away: what was done is to be undone. */
  cancel(): void;
}

/** A press that moves less than this is no drag, px. */
const STILL_PX = 3;

/** Follows one pointer from its press to its release, wherever it goes. */
export function followPointer(press: PointerEvent, element: Element, following: Following): void {
  const listeners = new AbortController();
  const options = { signal: listeners.signal };
  let moved = false;
  const only = (act: (event: PointerEvent) => void) => (event: PointerEvent) => event.pointerId === press.pointerId && act(event);
  const finish = (act: () => void) => {
    listeners.abort();
    act();
  };
  window.addEventListener(
    'pointermove',
    only((event) => {
      moved ||= Math.hypot(event.clientX - press.clientX, event.clientY - press.clientY) >= STILL_PX;
      if (moved) following.move(event);
    }),
    options,
  );
  window.addEventListener('pointerup', only(() => finish(() => following.end(moved))), options);
  window.addEventListener('pointercancel', only(() => finish(() => following.cancel())), options);
  window.addEventListener('keydown', (event) => event.key === 'Escape' && finish(() => following.cancel()), options);
  try {
    element.setPointerCapture(press.pointerId);
  } catch {
    // The pointer is already gone, or was made up by a script: listening on the window is enough.
  }
}
