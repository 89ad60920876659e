import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('..', import.meta.url));

/** Two projects, so that the mathematics never waits for a database. */
export default defineConfig({
  root,
  resolve: { alias: { '@oriel/shared': `${root}shared` } },
  test: {
    environment: 'node',
    testTimeout: 30_000,
    hookTimeout: 60_000,
    // Many tests of the server wait for a clock: one process more than two cores keeps both at work.
    maxWorkers: 3,
    // No test changes a module, so the files of a process share what has been loaded.
    isolate: false,
    projects: [
      {
        extends: true,
        test: { name: 'shared', include: ['shared/**/*.spec.ts', 'tests/{outside,packages,bench,video}/**/*.spec.ts'] },
      },
      {
        extends: true,
        test: {
          name: 'server',
          include: ['server/**/*.spec.ts', 'scripts/**/*.spec.ts'],
          globalSetup: 'server/testing/global-setup.ts',
        },
      },
    ],
  },
});
