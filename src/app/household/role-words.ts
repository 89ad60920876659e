import type { Role } from '@oriel/shared/contracts/role';

/** What each role may do, in a line, wherever a role is chosen. */
export const roleWords: Record<Role, string> = {
  owner: 'everything, and who belongs here',
  designer: 'photos and scenes',
  tuner: 'walls, cameras and tracking',
  viewer: 'look and play',
};
