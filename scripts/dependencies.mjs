import { existsSync, readFileSync } from 'node:fs';
import { run, lastLines } from './command.mjs';
import { inProject, root } from './project.mjs';

/**
 * Whether node_modules holds what package-lock.json asks for: npm writes what it installed to node_modules/.package-lock.json, as
 * its last act, so an interrupted installation has none. Optional packages for other platforms may be absent.
 */
export function dependenciesInstalled() {
  const installedFile = inProject('node_modules', '.package-lock.json');
  if (!existsSync(installedFile)) return false;
  const installed = JSON.parse(readFileSync(installedFile, 'utf8')).packages;
  const { '': _project, ...wanted } = JSON.parse(readFileSync(inProject('package-lock.json'), 'utf8')).packages;
  const same = (path) =>
    installed[path]?.version === wanted[path].version && installed[path]?.integrity === wanted[path].integrity;
  return (
    Object.keys(installed).every((path) => path in wanted) &&
    Object.entries(wanted).every(
      ([path, { optional, peer }]) => same(path) || (!(path in installed) && (optional || peer)),
    )
  );
}

/**
 * Installs exactly the locked packages; none of them gets to run a script.
 * @param {AbortSignal} [signal]
 * @throws Error with the end of what npm printed
 */
export async function installDependencies(signal) {
  const args = ['ci', '--ignore-scripts', '--no-fund', '--no-audit', '--loglevel=error'];
  const npm = process.env.npm_execpath;
  const { code, output } = await run(npm ? process.execPath : 'npm', npm ? [npm, ...args] : args, {
    cwd: root,
    signal,
  });
  if (code !== 0)
    throw new Error(`npm could not install the packages. Check the network, then try again.\n${lastLines(output, 15)}`);
}
