import { defineConfig } from '@playwright/test';
import type { BrowserChoice } from './fixtures';
import { inProject } from '../../scripts/project.mjs';

/**
 * Two projects: `camera` runs `*.camera.e2e.ts`, where a filmed face stands before the fake camera and is followed in time, one after
 * another and alone; `page` runs all other `*.e2e.ts`, two at a time. A file says with `test.use({ graphics, filmedFace })` how pictures
 * are drawn and what the camera shows.
 */
export default defineConfig<object, BrowserChoice>({
  testDir: '.',
  globalSetup: './set-up/serve-product.ts',
  workers: 2,
  // What passes only then is named where `npm test` counts it, and wants mending: a real browser on two laden cores is not yet steady in all.
  retries: 1,
  // Ends before `npm test` gives up on the whole part, so that what has been found is still counted.
  globalTimeout: process.env['CI'] ? 10 * 60_000 : 0,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  forbidOnly: true,
  reporter: [['list'], ['json', { outputFile: inProject('.oriel', 'reports', 'end-to-end.json') }]],
  use: {
    baseURL: process.env['ORIEL_URL'],
    trace: 'off',
    video: 'off',
    screenshot: 'off',
    viewport: { width: 1440, height: 900 },
    locale: 'en-GB',
  },
  projects: [
    { name: 'page', outputDir: inProject('test-results', 'page'), testMatch: /(?<!\.camera)\.e2e\.ts$/ },
    { name: 'camera', outputDir: inProject('test-results', 'camera'), testMatch: /\.camera\.e2e\.ts$/, workers: 1 },
  ],
});
