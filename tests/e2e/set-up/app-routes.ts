import { readFileSync, readdirSync } from 'node:fs';
import { inProject } from '../../../scripts/project.mjs';

const folder = inProject('src', 'app');
const loaded = /path: '([^']*)'[^{}]*?import\('\.\/([^']+\.routes)'\)/g;
const own = /path: '([^']*)'/g;
const inFolder = (file: string) => readFileSync(`${folder}/${file}`, 'utf8');

/**
 * Every address pattern of the app, such as `walls/:wallId`, as its `*.routes.ts` files say; `**` stands for all others.
 * @throws Error where a file of routes is loaded in a way that is not understood here
 */
export function appRoutes(): string[] {
  const features = [...inFolder('app.routes.ts').matchAll(loaded)].map(([, prefix, file]) => ({ prefix, file: `${file}.ts` }));
  const known = new Set(['app.routes.ts', ...features.map(({ file }) => file)]);
  const unknown = readdirSync(folder, { recursive: true, encoding: 'utf8' }).filter((file) => file.endsWith('.routes.ts') && !known.has(file));
  if (unknown.length > 0) throw new Error(`Loaded by nobody this test understands: ${unknown.join(', ')}`);
  const patterns = features.flatMap(({ prefix, file }) =>
    [...inFolder(file).matchAll(own)].map(([, path]) => [prefix, path].filter(Boolean).join('/')),
  );
  return [...new Set([...patterns, '**'])].sort();
}
