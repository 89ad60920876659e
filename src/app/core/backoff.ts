/** Waits that grow with each failure in a row, ms: from `firstMs`, doubled, to `longestMs`. */
export class Backoff {
  private failures = 0;

  constructor(
    private readonly firstMs: number,
    private readonly longestMs: number,
  ) {}

  /** How long to wait after one more failure; a little more or less by `chance` (0 to 1), so that screens do not all come back at once. */
  next(chance = Math.random()): number {
    const waitMs = Math.min(this.longestMs, this.firstMs * 2 ** this.failures);
    this.failures = Math.min(this.failures + 1, 30);
    return waitMs * (0.8 + 0.4 * chance);
  }

  succeeded(): void {
    this.failures = 0;
  }
}
