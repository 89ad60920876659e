import { BLINK_MS, blinkPlan, SYMBOL_MS } from '@oriel/shared/mirror/blink-plan';
import { bestPlace, mirrorDelay, type Drawn, type MirrorDelay, type Seen } from '@oriel/shared/mirror/mirror-delay';
import { ACROSS, DOWN } from './brightness';

/** Frames looked at after the last change, so that its delay is seen too. */
const AFTER_MS = 700;

/** One blink and what the camera saw meanwhile: when which level was drawn, and how bright each part of the picture was. Times in ms on the page's clock. */
export class Blink {
  private readonly plan = blinkPlan();
  private readonly drawn: Drawn[] = [];
  private readonly places: Seen[][] = Array.from({ length: ACROSS * DOWN }, () => []);

  private endMs = Infinity;

  /** The level to draw at `tMs`; null once the plan is over. The first call begins it. */
  levelAt(tMs: number): number | null {
    const start = this.drawn[0]?.atMs ?? tMs;
    const symbol = Math.floor((tMs - start) / SYMBOL_MS);
    const level = this.plan[symbol] ?? null;
    const last = this.drawn[this.drawn.length - 1];
    if (level === null) {
      if (last.level >= 0 && this.endMs === Infinity) {
        this.drawn.push({ atMs: tMs, level: last.level });
        this.endMs = tMs;
      }
      return null;
    }
    if (!last || last.level !== level) this.drawn.push({ atMs: tMs, level });
    return level;
  }

  /** Whether everything was drawn and the camera had time to see it. */
  over(tMs: number): boolean {
    return tMs > this.endMs + AFTER_MS;
  }

  /** 0 to 1. */
  share(tMs: number): number {
    const start = this.drawn[0]?.atMs ?? tMs;
    return Math.min(1, (tMs - start) / BLINK_MS);
  }

  see(capturedMs: number, parts: Float64Array): void {
    parts.forEach((brightness, place) => this.places[place].push({ atMs: capturedMs, brightness }));
  }

  /** The delay; or how badly the best part of the picture followed. */
  result(): { readonly delay: MirrorDelay | null; readonly correlation: number } {
    const { place, correlation } = bestPlace(this.drawn, this.places);
    return { delay: place < 0 ? null : mirrorDelay(this.drawn, this.places[place]), correlation };
  }
}
