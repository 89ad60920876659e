import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { mustRun } from '../command.mjs';
import { inProject, root } from '../project.mjs';
import { bundleServer } from './bundle-server.mjs';
import { compressFiles } from './compress-files.mjs';
import { sourcesHash } from './sources-hash.mjs';
import { listWallFiles } from './wall-files.mjs';

/** Within the page's folder, which a bare `ng build` empties: what that leaves is not the product, and is built anew. */
const stamp = inProject('dist', 'web', '.built-from');
const results = ['dist/web/index.html', 'dist/server/main.js'];

/** Whether dist/ holds what today's sources give. */
export function productBuilt() {
  return (
    results.every((path) => existsSync(inProject(path))) &&
    existsSync(stamp) &&
    readFileSync(stamp, 'utf8') === sourcesHash()
  );
}

/**
 * Builds page and server into dist/.
 * @param {AbortSignal} [signal]
 * @throws Error with the end of what the compiler printed
 */
export async function buildProduct(signal) {
  const hash = sourcesHash();
  rmSync(stamp, { force: true });
  const angular = inProject('node_modules/@angular/cli/bin/ng.js');
  const env = { ...process.env, NG_CLI_ANALYTICS: 'false', NO_COLOR: '1' };
  await Promise.all([
    mustRun(process.execPath, [angular, 'build', '--progress=false', '--stats-json'], { cwd: root, env, signal }),
    bundleServer(),
  ]);
  listWallFiles(inProject('dist', 'web'));
  await compressFiles(inProject('dist', 'web'));
  writeFileSync(stamp, hash);
}
