/**
 * Says in plain words what is being done, and once it is done how long it took. On a terminal the line of a step under way is
 * rewritten; elsewhere only finished steps are written.
 * @param {NodeJS.WriteStream} out
 */
export function stepsOn(out) {
  const began = Date.now();
  /**
   * @template T @param {string} doing e.g. 'Building the page' @param {(say: (text: string) => void) => Promise<T>} work
   * @returns {Promise<T>}
   */
  async function step(doing, work) {
    const start = Date.now();
    let now = doing;
    const draw = () => out.isTTY && out.write(`\r\x1b[K  ${now} … ${seconds(start)}`);
    const timer = setInterval(draw, 1000);
    draw();
    try {
      const result = await work((text) => {
        now = text;
        draw();
      });
      finish(`  ${now} (${seconds(start)})`);
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
