import { existsSync, readFileSync } from 'node:fs';
import { inProject } from '../project.mjs';

/**
 * Every package of package-lock.json, each version once. The licence is the lock's, or, where an old package states it in another
 * form, that of its own package.json.
 * @returns {{ name: string, version: string, licence: string, production: boolean }[]} by name
 */
export function lockedPackages() {
  const { '': _project, ...locked } = JSON.parse(readFileSync(inProject('package-lock.json'), 'utf8')).packages;
  const found = new Map();
  for (const [path, { version, license, dev }] of Object.entries(locked)) {
    const name = path.slice(path.lastIndexOf('node_modules/') + 'node_modules/'.length);
    const earlier = found.get(`${name} ${version}`);
    const production = !dev || (earlier?.production ?? false);
    found.set(`${name} ${version}`, { name, version, licence: license ?? licenceOf(path), production });
  }
  return [...found.values()].sort((a, b) =>
    a.name < b.name ? -1 : a.name > b.name ? 1 : a.version < b.version ? -1 : 1,
  );
}

function licenceOf(path) {
  const file = inProject(path, 'package.json');
  if (!existsSync(file)) return 'unknown';
  const { license, licenses } = JSON.parse(readFileSync(file, 'utf8'));
  return license?.type ?? license ?? licenses?.map(({ type }) => type).join(' AND ') ?? 'unknown';
}
