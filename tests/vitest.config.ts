import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('..', import.meta.url));

export default defineConfig({
  root,
  resolve: { alias: { '@oriel/shared': `${root}shared` } },
  test: {
    include: ['shared/**/*.spec.ts', 'server/**/*.spec.ts', 'tests/outside/**/*.spec.ts'],
    environment: 'node',
    globalSetup: 'tests/start-postgres.ts',
    testTimeout: 30_000,
    hookTimeout: 60_000,
  },
});
