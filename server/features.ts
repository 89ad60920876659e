import { accountRoutes } from './accounts/account-routes';
import { healthRoutes } from './health/health-routes';
import { householdRoutes } from './households/household-routes';
import type { Feature } from './http/mount';
import type { Parts } from './parts';
import { photoRoutes } from './photos/photo-routes';
import { runRoutes } from './runs/run-routes';
import { sceneRoutes } from './scenes/scene-routes';
import { pairingRoutes } from './walls/pairing-routes';
import { screenRoutes } from './walls/screen-routes';
import { wallRoutes } from './walls/wall-routes';

/** Every feature of the server, one a line: what main.ts serves and what the tests hold against the contract. */
export const features = (parts: Parts): readonly Feature[] => [
  accountRoutes(parts),
  householdRoutes(parts),
  photoRoutes(parts),
  sceneRoutes(parts),
  wallRoutes(parts),
  pairingRoutes(parts),
  screenRoutes(parts),
  runRoutes(parts),
  healthRoutes(parts),
];
