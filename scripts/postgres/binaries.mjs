import { existsSync, readdirSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { run } from '../command.mjs';
import { installPostgresFromDebian, mayInstall } from '../debian.mjs';

const debianFolder = '/usr/lib/postgresql';
const needed = ['initdb', 'postgres'];
const oldestMajor = 13;

/**
 * The folder of PostgreSQL's server programs, installed from Debian first where there are none and this process may.
 * @param {{ major?: number, say: (text: string) => void, signal?: AbortSignal }} options major: only this version will do
 * @returns {Promise<string>}
 * @throws Error that says what to install, and how
 */
export async function postgresBinaries({ major, say, signal }) {
  const found = await search(major);
  if (found) return found;
  if (!mayInstall()) throw new Error(howToInstall(major));
  say('Installing PostgreSQL from Debian');
  await installPostgresFromDebian(signal);
  const installed = await search(major);
  if (!installed) throw new Error(howToInstall(major));
  return installed;
}

/** The newest that fits: Debian's own folders first, since its programs are not on the PATH. */
async function search(major) {
  const versions = existsSync(debianFolder) ? readdirSync(debianFolder) : [];
  const debian = versions.map(Number).filter((version) => version >= oldestMajor);
  const folders = [
    ...debian.sort((a, b) => b - a).map((version) => join(debianFolder, String(version), 'bin')),
    ...(process.env.PATH ?? '').split(delimiter),
  ];
  for (const folder of folders) {
    if (!needed.every((program) => existsSync(join(folder, program)))) continue;
    const version = await majorOf(join(folder, 'postgres'));
    if (major === undefined ? version >= oldestMajor : version === major) return folder;
  }
  return null;
}

async function majorOf(program) {
  const { output } = await run(program, ['--version']);
  return Number(/(\d+)/.exec(output)?.[1] ?? 0);
}

function howToInstall(major) {
  const name = major === undefined ? 'postgresql' : `postgresql-${major}`;
  const what =
    major === undefined
      ? 'PostgreSQL is not installed'
      : `Oriel's database was made by PostgreSQL ${major}, which is not installed`;
  return [
    `${what}, and only root may install it. Run this once, then start again:`,
    `  sudo apt-get update && sudo apt-get install -y ${name}`,
    'Or set DATABASE_URL to a PostgreSQL server of your own.',
  ].join('\n');
}
