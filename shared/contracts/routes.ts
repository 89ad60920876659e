import * as accounts from './accounts';
import * as health from './health';
import * as households from './households';
import * as photos from './photos';
import type { Route } from './route';
import * as runs from './runs';
import * as scenes from './scenes';
import * as viewerScales from './viewer-scales';
import * as wallPairing from './wall-pairing';
import * as wallScreen from './wall-screen';
import * as walls from './walls';

const isRoute = (value: unknown): value is Route =>
  typeof value === 'object' && value !== null && 'method' in value && 'access' in value;

/** Every route of the product, for the server to prove that it mounts them all and for the tests to walk. */
export const allRoutes: readonly Route[] = [accounts, households, photos, scenes, walls, wallPairing, wallScreen, viewerScales, runs, health].flatMap(
  (feature) => Object.values<unknown>(feature).filter(isRoute),
);
