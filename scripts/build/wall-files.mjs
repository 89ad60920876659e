import { readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

const wallEntry = 'src/app/wall/wall.routes.ts';
/** A worker is no import of the page that starts it: its name stands in the page's text. */
const workerName = /\bworker-[A-Z0-9]+\.js\b/g;

/**
 * Takes out of the list of a wall's service worker every script that its page can never load: the other pages' chunks. What remains is what the
 * application begins with, the wall's own entry, and whatever that may load later, workers too.
 * @param {string} webDir where `ng build --stats-json` has written; its stats.json is read and removed.
 */
export function listWallFiles(webDir) {
  const statsFile = join(webDir, 'stats.json');
  const listFile = join(webDir, 'ngsw.json');
  const { outputs } = JSON.parse(readFileSync(statsFile, 'utf8'));
  const list = JSON.parse(readFileSync(listFile, 'utf8'));
  const needed = neededOf(outputs, (name) => readFileSync(join(webDir, name), 'utf8'));
  const unneeded = (url) => url.endsWith('.js') && !needed.has(url.slice(1));
  for (const group of list.assetGroups) group.urls = group.urls.filter((url) => !unneeded(url));
  list.hashTable = Object.fromEntries(Object.entries(list.hashTable).filter(([url]) => !unneeded(url)));
  writeFileSync(listFile, JSON.stringify(list, null, 2));
  rmSync(statsFile);
}

/**
 * @param {Record<string, { entryPoint?: string, imports: { path: string, kind: string }[] }>} outputs of esbuild's metafile
 * @param {(name: string) => string} textOf
 * @returns {Set<string>} names of the scripts that the wall's page may load
 */
export function neededOf(outputs, textOf) {
  const entryOf = (source) => {
    const [name] = Object.entries(outputs).find(([, { entryPoint }]) => entryPoint === source) ?? [];
    if (!name) throw new Error(`The build has no chunk for ${source}: what a wall keeps cannot be told.`);
    return name;
  };
  const needed = new Set();
  const add = (name, lazily) => {
    if (needed.has(name)) return;
    needed.add(name);
    for (const { path, kind } of outputs[name]?.imports ?? [])
      if (outputs[path] && (lazily || kind === 'import-statement')) add(path, lazily);
    if (lazily) for (const worker of textOf(name).match(workerName) ?? []) add(worker, lazily);
  };
  // The wall's own first: what it shares with the start must bring its lazy parts too.
  add(entryOf(wallEntry), true);
  add(entryOf('src/main.ts'), false);
  return needed;
}
