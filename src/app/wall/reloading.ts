/** A page that fails over and over must not flicker: it loads itself anew no more often, ms. */
export const betweenReloadsMs = 5 * 60_000;

const nightHour = 4;
/** Screens that share a server do not all come at once. */
const spreadMs = 15 * 60_000;
const hourMs = 3_600_000;

/** How long until a page may load itself anew; 0 when it may now. `lastMs`: when it last did, null before it ever did. */
export function waitToReload(lastMs: number | null, nowMs: number): number {
  // A clock set back must not forbid it for ever.
  if (lastMs === null || lastMs > nowMs) return 0;
  return Math.max(0, lastMs + betweenReloadsMs - nowMs);
}

/** How long until the next four o'clock at night of this place, and up to a quarter of an hour more by `chance` (0 to 1); an hour at the least. */
export function untilNight(now: Date, chance: number): number {
  const night = new Date(now);
  night.setHours(nightHour, 0, 0, 0);
  while (night.getTime() - now.getTime() < hourMs) night.setDate(night.getDate() + 1);
  return night.getTime() - now.getTime() + chance * spreadMs;
}
