const worthALineMs = 500;

/**
 * Says in plain words what is being done, and once it is done how long it took. On a terminal the line of a step under way is
 * rewritten; elsewhere only finished steps are written.
 * @param {NodeJS.WriteStream} out
 */
export function stepsOn(out) {
  const began = Date.now();
  /**
   * @template T
   * @param {string} doing e.g. 'Building'
   * @param {(next: (doing: string) => void) => Promise<T>} work may say that something else is being done from now on
   * @param {(result: T) => string} [done] what to call it when it is done; as before unless given
   * @returns {Promise<T>}
   */
  async function step(doing, work, done) {
    let start = Date.now();
    let now = doing;
    const draw = () => out.isTTY && out.write(`\r\x1b[K  ${now} … ${seconds(start)}`);
    const next = (text) => {
      if (Date.now() - start > worthALineMs) finish(`  ${now} (${seconds(start)})`);
      now = text;
      start = Date.now();
      draw();
    };
    const timer = setInterval(draw, 1000);
    draw();
    try {
      const result = await work(next);
      finish(`  ${done?.(result) ?? now} (${seconds(start)})`);
      return result;
    } catch (error) {
      finish(`  ${now}: not done (${seconds(start)})`);
      throw error;
    } finally {
      clearInterval(timer);
    }
  }
  const finish = (line) => out.write(out.isTTY ? `\r\x1b[K${line}\n` : `${line}\n`);
  return { step, elapsed: () => seconds(began) };
}

const seconds = (since) => `${((Date.now() - since) / 1000).toFixed(1)} s`;
