import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { inProject } from '../../scripts/project.mjs';

const notCommitted = new Set(
  readFileSync(inProject('.gitignore'), 'utf8')
    .split('\n')
    .map((line) => line.replace(/\/$/, '')),
);
const binary = /\.(png|jpe?g|webp|avif|heic|tiff?|gif|bin|wasm|woff2|psd|ora|mjpeg|log)$/i;

/** The project's files, those that git ignores and binaries left out: binaries hold no words. */
function filesUnder(folder: string): string[] {
  return readdirSync(inProject(folder), { withFileTypes: true })
    .filter(({ name }) => name !== '.git' && !notCommitted.has(name))
    .flatMap((entry) => (entry.isDirectory() ? filesUnder(join(folder, entry.name)) : [join(folder, entry.name)]));
}

const files = filesUnder('.').filter((path) => !binary.test(path));

/** Lines of these files that match, as `file: line`. */
function lines(pattern: RegExp): string[] {
  return files.flatMap((path) =>
    readFileSync(inProject(path), 'utf8')
      .split('\n')
      .filter((line) => pattern.test(line))
      .map((line) => `${path}: ${line.slice(0, 120)}`),
  );
}

test('no file names the host of a package registry', () => {
  const hosts = [
    ['registry', 'npmjs', 'org'],
    ['registry', 'yarnpkg', 'com'],
    ['npm', 'pkg', 'github', 'com'],
  ].map((parts) => parts.join('\\.'));
  expect(lines(new RegExp(`${hosts.join('|')}|https?://[^/\\s"']*(artifactory|nexus|verdaccio)`, 'i'))).toEqual([]);
});

test('no file names a folder of the machine it was written on', () => {
  const folders = ['work', 'root', 'home'].map((name) => `/${name}/`).join('|');
  expect(lines(new RegExp(`(^|[\\s"'\`(=:])(${folders})\\w`))).toEqual([]);
});

test('no secret lies among them', () => {
  expect(files.filter((path) => /(^|\/)(\.env|session-secret|access\.json)$|\.(pem|key)$/.test(path))).toEqual([]);
  expect(lines(/-----BEGIN (RSA |EC )?PRIVATE KEY-----/)).toEqual([]);
});
