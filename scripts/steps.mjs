const worthALineMs = 500;

/**
 * Says in plain words what is being done, and once it is done how long it took. On a terminal one line names the steps under way
 * and is rewritten; elsewhere only finished steps are written. Steps may run side by side.
 * @param {NodeJS.WriteStream} out
 */
export function stepsOn(out) {
  const began = Date.now();
  /** @type {Set<{ now: string, start: number }>} */
  const underWay = new Set();
  const draw = () => {
    if (!out.isTTY) return;
    const doing = [...underWay].map(({ now, start }) => `${now} … ${seconds(start)}`).join(' · ');
    out.write(`\r\x1b[K  ${doing}`.slice(0, (out.columns || 80) + 3));
  };
  const write = (text) => {
    out.write(out.isTTY ? `\r\x1b[K${text}\n` : `${text}\n`);
    if (underWay.size > 0) draw();
  };

  /**
   * @template T
   * @param {string} doing e.g. 'Building'
   * @param {(next: (doing: string) => void) => Promise<T>} work may say that something else is being done from now on
   * @param {(result: T) => string} [done] what to call it when it is done; as before unless given
   * @returns {Promise<T>}
   */
  async function step(doing, work, done) {
    const own = { now: doing, start: Date.now() };
    const took = () => seconds(own.start);
    const next = (text) => {
      if (Date.now() - own.start > worthALineMs) write(`  ${own.now} (${took()})`);
      own.now = text;
      own.start = Date.now();
      draw();
    };
    underWay.add(own);
    const timer = setInterval(draw, 1000);
    draw();
    const finish = (line) => {
      underWay.delete(own);
      write(line);
    };
    try {
      const result = await work(next);
      finish(`  ${done?.(result) ?? own.now} (${took()})`);
      return result;
    } catch (error) {
      finish(`  ${own.now}: not done (${took()})`);
      throw error;
    } finally {
      clearInterval(timer);
    }
  }
  return { step, write, elapsed: () => seconds(began) };
}

const seconds = (since) => `${((Date.now() - since) / 1000).toFixed(1)} s`;
