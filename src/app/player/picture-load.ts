/** Waits between tries, ms. */
const pauses = [400, 1600];

/**
 * Tries to load a picture three times, with a pause between; gives null when it did not come or the signal aborts.
 * A wall is often on a poor network, and one lost reply must not leave a hole.
 */
export async function loadPicture<T>(load: () => Promise<T>, signal: AbortSignal): Promise<T | null> {
  for (const pause of [...pauses, null]) {
    if (signal.aborted) return null;
    try {
      return await load();
    } catch {
      if (pause === null) break;
      await waited(pause, signal);
    }
  }
  return null;
}

function waited(ms: number, signal: AbortSignal): Promise<void> {
  return new Promise((resolve) => {
    const done = () => {
      clearTimeout(timer);
      signal.removeEventListener('abort', done);
      resolve();
    };
    const timer = setTimeout(done, ms);
    signal.addEventListener('abort', done);
  });
}
