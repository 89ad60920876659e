import { maximalSequence } from './maximal-sequence';

/*
 * How the wall blinks. WCAG 2.2, 2.3.1 (read) allows three flashes a second, a flash being a pair of opposing changes of luminance. Here
 * the light changes at most once every half second, so that there is at most one flash a second: a third of the limit, whatever the size
 * of the patch.
 */

/** The shortest time between two changes, ms. Not a multiple of a 30 a second camera's interval, so that changes meet it at various phases. */
export const SYMBOL_MS = 530;
const STAGES = 5;
/** Periods shown: the first teaches the exposure, each later one gives delays of its own. */
const PERIODS = 2;

/** The levels to show one after the other, `SYMBOL_MS` each: 1 the lighter, 0 the darker. */
export const blinkPlan = (): number[] => Array.from({ length: PERIODS }, () => maximalSequence(STAGES)).flat();

/** How long it takes, ms. */
export const BLINK_MS = PERIODS * (2 ** STAGES - 1) * SYMBOL_MS;
