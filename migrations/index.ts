import type { Migration } from 'kysely';
import { foundation } from './0001-foundation';
import { unusedImages } from './0002-unused-images';
import { milestone } from './0003-milestone';
import { walls } from './0004-walls';
import { tries } from './0005-tries';

/** Every migration by name, in order. A static table, for the server is one bundle and has no folder to scan. */
export const migrations: Record<string, Migration> = {
  '0001-foundation': foundation,
  '0002-unused-images': unusedImages,
  '0003-milestone': milestone,
  '0004-walls': walls,
  '0005-tries': tries,
};
