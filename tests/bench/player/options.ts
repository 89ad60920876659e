import { parseArgs } from 'node:util';
import { COMPUTERS, type ComputerName } from './computers';

/** Sizes of the screen, device px. */
export const SIZES = { '720p': [1280, 720], '1080p': [1920, 1080], '4k': [3840, 2160] } as const;
export type SizeName = keyof typeof SIZES;

const RENDERERS = ['css', 'three'] as const;
const PAGES = ['wall', 'player'] as const;
const TRACKING = ['on', 'off'] as const;

/** One thing to measure. */
export interface Condition {
  readonly page: (typeof PAGES)[number];
  readonly layers: number;
  readonly size: SizeName;
  readonly renderer: (typeof RENDERERS)[number];
  readonly tracking: (typeof TRACKING)[number];
  readonly computer: ComputerName;
}

export interface Options {
  readonly conditions: readonly Condition[];
  /** Measured for so long, after the ladder was given so long to settle. */
  readonly seconds: number;
  readonly settleSeconds: number;
  /** Scene changes of the leak test; 0 leaves it out. */
  readonly changes: number;
  /** Whether each second of each condition is printed. */
  readonly trace: boolean;
}

export const USAGE = `npm run bench:player -- [--layers 3,8,16] [--size 720p,1080p,4k] [--renderer css,three] [--tracking on,off]
    [--computer ${Object.keys(COMPUTERS).join(',')}] [--page wall,player] [--seconds 8] [--settle 12] [--changes 500] [--trace]
    Each list is all of its values where left out, but the page, which is the wall's. --changes N alone runs the leak test and nothing else;
    with any list given, the leak test is left out unless asked for.`;

/** Reads the command line. @throws Error that says what may be given. */
export function readOptions(args: readonly string[]): Options {
  const list = { type: 'string' } as const;
  const { values } = parseArgs({
    args: [...args],
    options: { layers: list, size: list, renderer: list, tracking: list, computer: list, page: list, seconds: list, settle: list, changes: list, trace: { type: 'boolean' } },
  });
  const listed = [values.layers, values.size, values.renderer, values.tracking, values.computer, values.page].some((value) => value !== undefined);
  const onlyChanges = values.changes !== undefined && !listed;
  const layers = (values.layers ?? '3,8,16').split(',').map((text) => whole('layers', text, 1, 64));
  const sizes = chosen('size', values.size, Object.keys(SIZES) as SizeName[]);
  const renderers = chosen('renderer', values.renderer, RENDERERS);
  const tracking = chosen('tracking', values.tracking, TRACKING);
  const computers = chosen('computer', values.computer, Object.keys(COMPUTERS) as ComputerName[]);
  const pages = chosen('page', values.page ?? 'wall', PAGES);
  const conditions = computers.flatMap((computer) =>
    pages.flatMap((page) =>
      sizes.flatMap((size) =>
        layers.flatMap((count) => renderers.flatMap((renderer) => tracking.map((on): Condition => ({ page, layers: count, size, renderer, tracking: on, computer })))),
      ),
    ),
  );
  return {
    conditions: onlyChanges ? [] : conditions,
    seconds: whole('seconds', values.seconds ?? '8', 1, 600),
    settleSeconds: whole('settle', values.settle ?? '12', 0, 600),
    changes: whole('changes', values.changes ?? (listed ? '0' : '500'), 0, 100_000),
    trace: values.trace ?? false,
  };
}

function chosen<T extends string>(name: string, text: string | undefined, known: readonly T[]): readonly T[] {
  if (text === undefined) return known;
  return text.split(',').map((part) => {
    const found = known.find((one) => one === part.trim().toLowerCase());
    if (!found) throw new Error(`--${name} ${part} is not known; there are ${known.join(', ')}.\n${USAGE}`);
    return found;
  });
}

function whole(name: string, text: string, least: number, most: number): number {
  const value = Number(text);
  if (!Number.isInteger(value) || value < least || value > most) throw new Error(`--${name} wants whole numbers from ${String(least)} to ${String(most)}, not ${text}.\n${USAGE}`);
  return value;
}
