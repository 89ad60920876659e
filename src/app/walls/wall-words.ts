import { type Wall, silentAfterMs } from '@oriel/shared/contracts/walls';
import { LADDER_STEPS } from '@oriel/shared/ladder/steps';
import type { ViewingZone } from '@oriel/shared/projection/types';
import { clockTime, sayMoment } from '../core/moments';

/** A wall's state in words, and whether all is well, something is amiss, or it simply is not running yet. */
export interface WallState {
  readonly tone: 'well' | 'amiss' | 'idle';
  readonly words: string;
}

const minuteMs = 60_000;
const plural = (count: number, one: string) => `${count} ${one}${count === 1 ? '' : 's'}`;

/** A span of time in its largest whole unit: "3 hours". */
export function sayLong(ms: number): string {
  const minutes = Math.floor(ms / minuteMs);
  if (minutes < 1) return plural(Math.floor(ms / 1000), 'second');
  if (minutes < 60) return plural(minutes, 'minute');
  if (minutes < 24 * 60) return plural(Math.floor(minutes / 60), 'hour');
  return plural(Math.floor(minutes / (24 * 60)), 'day');
}

/** What a wall does now. `sceneName` is that of the scene it is to show; null where none is chosen or it is gone. */
export function stateOf(wall: Wall, sceneName: string | null, now: Date): WallState {
  const heard = wall.heardAt === null ? null : new Date(wall.heardAt);
  if (wall.pairedAt === null) {
    return { tone: 'idle', words: heard ? `No screen is paired; one was last heard ${sayMoment(heard, now)}` : 'Never paired' };
  }
  if (!heard) return { tone: 'idle', words: 'Paired; its screen has not reported yet' };
  if (isSilent(wall, now)) {
    const silentMs = now.getTime() - heard.getTime();
    const last = heard.toDateString() === now.toDateString() ? clockTime(heard) : sayMoment(heard, now);
    return { tone: 'amiss', words: `Silent for ${sayLong(silentMs)} (last heard ${last})` };
  }
  if (!sceneName) return { tone: 'idle', words: 'Running, with nothing to show: choose a scene' };
  const { report } = wall;
  if (!report) return { tone: 'well', words: `Showing ${sceneName}` };
  if (LADDER_STEPS[report.ladderStep]?.looking.by === 'nothing') {
    return { tone: 'amiss', words: `Showing ${sceneName}, but following nobody: its computer is too slow at present` };
  }
  return {
    tone: 'well',
    words: `Showing ${sceneName}, ${plural(Math.round(report.trackedPerS), 'face')} and ${plural(Math.round(report.framesPerS), 'frame')} a second`,
  };
}

const isSilent = ({ heardAt }: Wall, now: Date): boolean => heardAt !== null && now.getTime() - new Date(heardAt).getTime() > silentAfterMs;

/** What else its newest report tells, a line each: how it follows, how late, how warm. Nothing of a silent wall: that was so once. */
export function reportLines(wall: Wall, now: Date): string[] {
  const { report } = wall;
  if (!report || isSilent(wall, now)) return [];
  const late = report.latencyMs === null ? '' : `, ${Math.round(report.latencyMs)} ms behind`;
  return [
    `${report.tracking}: ${report.ladderWords || `step ${report.ladderStep} of the ladder`}${late}`,
    ...(report.temperatureC === null ? [] : [`${Math.round(report.temperatureC)} °C inside`]),
  ];
}

/** "1500 to 3200 mm away, 500 mm left to 500 mm right, 200 mm down to 200 mm up". */
export function describeZone(zone: ViewingZone): string {
  const end = (mm: number, positive: string, negative: string) => `${Math.abs(Math.round(mm))} mm ${mm < 0 ? negative : positive}`;
  return [
    `${Math.round(zone.nearestMm)} to ${Math.round(zone.farthestMm)} mm away`,
    `${end(zone.leftMm, 'right', 'left')} to ${end(zone.rightMm, 'right', 'left')}`,
    `${end(zone.lowestMm, 'up', 'down')} to ${end(zone.highestMm, 'up', 'down')}`,
  ].join(', ');
}

/** What becomes of a zone, as far as it changes: "begins 1.4 m away instead of 1.2 m, and is 1.2 m across instead of 1.4 m". */
export function describeChange(before: ViewingZone, after: ViewingZone): string {
  const metres = (mm: number) => `${Number((mm / 1000).toFixed(2))} m`;
  const across = (zone: ViewingZone) => zone.rightMm - zone.leftMm;
  const high = (zone: ViewingZone) => zone.highestMm - zone.lowestMm;
  const changes = [
    { verb: 'begins', from: before.nearestMm, to: after.nearestMm, what: 'away' },
    { verb: 'is', from: across(before), to: across(after), what: 'across' },
    { verb: 'is', from: high(before), to: high(after), what: 'high' },
  ].filter(({ from, to }) => from !== to);
  const words = changes.map(({ verb, from, to, what }) => `${verb} ${metres(to)} ${what} instead of ${metres(from)}`);
  return words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}
