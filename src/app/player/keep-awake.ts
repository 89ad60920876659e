/** Keeps the screen from going dark, where the browser can, until the returned function is called; taken up again when the page is seen again. */
export function keepAwake(document: Document): () => void {
  const { wakeLock } = document.defaultView!.navigator as Partial<Pick<Navigator, 'wakeLock'>>;
  let over = false;
  let lock: WakeLockSentinel | null = null;
  const take = async () => {
    if (over || !wakeLock || document.visibilityState !== 'visible') return;
    // A low battery may refuse; the picture plays on all the same.
    const taken = await wakeLock.request('screen').catch(() => null);
    if (over) void taken?.release();
    else lock = taken;
  };
  document.addEventListener('visibilitychange', take);
  void take();
  return () => {
    over = true;
    document.removeEventListener('visibilitychange', take);
    void lock?.release();
  };
}
