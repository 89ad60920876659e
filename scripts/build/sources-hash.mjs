import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { inProject } from '../project.mjs';

const sources = [
  ...['src', 'server', 'shared', 'migrations', 'assets', 'fonts', 'scripts/build', 'angular.json', 'package-lock.json'],
  ...['tsconfig.base.json', 'tsconfig.app.json', 'tsconfig.worker.json', 'ngsw-config.json'],
];

/** One hash over the names and contents of everything the build reads; tests do not count. @returns {string} hex */
export function sourcesHash() {
  const hash = createHash('sha256');
  for (const path of sources.flatMap(filesUnder))
    hash
      .update(`${path}\0`)
      .update(readFileSync(inProject(path)))
      .update('\0');
  return hash.digest('hex');
}

function filesUnder(path) {
  if (!existsSync(inProject(path))) return [];
  if (!statSync(inProject(path)).isDirectory()) return [path];
  return readdirSync(inProject(path))
    .sort()
    .flatMap((name) => filesUnder(join(path, name)))
    .filter((file) => !file.endsWith('.spec.ts'));
}
