import type { Spread } from './figures';
import type { Measured } from './measure';
import type { Condition } from './options';

const columns: readonly [head: string, width: number, of: (condition: Condition, measured: Measured) => string][] = [
  ['computer', 12, ({ computer }) => computer],
  ['page', 7, ({ page }) => page],
  ['layers', 7, ({ layers }) => String(layers)],
  ['size', 6, ({ size }) => size],
  ['drawn by', 9, ({ renderer }) => renderer],
  ['tracking', 9, ({ tracking }) => tracking],
  ['frames/s', 9, (_, { framesPerS }) => framesPerS.toFixed(1)],
  ['frame ms', 12, (_, { frameMs }) => spreadWords(frameMs)],
  ['cpu ms/frame', 13, (_, { processorMsPerFrame }) => processorMsPerFrame.toFixed(1)],
  ['cpu', 5, (_, { processorShare }) => processorShare.toFixed(2)],
  ['tracked/s', 10, ({ tracking }, { trackedPerS }) => (tracking === 'on' ? trackedPerS.toFixed(1) : '–')],
  ['look ms', 11, (_, { lookMs }) => spreadWords(lookMs)],
  ['capture–drawn', 14, (_, { captureToDrawnMs }) => spreadWords(captureToDrawnMs)],
  ['drawn–lit', 10, (_, { drawnToPresentedMs }) => spreadWords(drawnToPresentedMs)],
  ['MB', 5, (_, { graphicsMB }) => graphicsMB.toFixed(0)],
  ['step', 5, ({ tracking }, { ladderStep }) => (tracking === 'on' ? String(ladderStep) : '–')],
];

const spreadWords = (spread: Spread): string => (spread ? `${spread[0].toFixed(0)}/${spread[1].toFixed(0)}` : '–');

export const tableHead = (): string => columns.map(([head, width]) => head.padEnd(width)).join(' ');

/** A condition and what came of it, on one line; delays and intervals as median/95th percentile, ms. */
export const tableLine = (condition: Condition, measured: Measured): string => columns.map(([, width, of]) => of(condition, measured).padEnd(width)).join(' ');

/** What a condition is called where it failed. */
export const conditionWords = ({ computer, page, layers, size, renderer, tracking }: Condition): string =>
  `${computer}, ${page}, ${String(layers)} layers, ${size}, ${renderer}, tracking ${tracking}`;
