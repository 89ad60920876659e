const names = ['SIGINT', 'SIGTERM', 'SIGHUP'];

/**
 * Ctrl-C, a request to end and a closed terminal, as one signal that everything under way listens to; once it is given, more of them
 * change nothing, for stopping has begun.
 * @returns {{ signal: AbortSignal, stopped: Promise<void> }}
 */
export function stopSignal() {
  const controller = new AbortController();
  const stopped = new Promise((resolve) =>
    controller.signal.addEventListener('abort', () => resolve(), { once: true }),
  );
  for (const name of names) process.on(name, () => controller.abort(new Error(`stopped by ${name}`)));
  return { signal: controller.signal, stopped };
}
