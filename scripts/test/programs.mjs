import { existsSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { installFromDebian, mayInstall } from '../debian.mjs';

/** The programs the tests need beside PostgreSQL: Debian package, and the names its program may have. */
const needed = [
  { name: 'chromium', programs: ['chromium'] },
  { name: 'ffmpeg', programs: ['ffmpeg'] },
];

/**
 * Installs from Debian what the tests need and this machine lacks.
 * @param {{ say: (text: string) => void, signal?: AbortSignal }} options
 * @throws Error with the command to run, where only root may install
 */
export async function installPrograms({ say, signal }) {
  const missing = needed.filter(({ programs }) => !programs.some(onPath)).map(({ name }) => name);
  if (missing.length === 0) return;
  if (!mayInstall()) {
    throw new Error(
      `The tests need ${missing.join(' and ')}, and only root may install them. Run this once, then again:\n` +
        `  sudo apt-get update && sudo apt-get install -y ${missing.join(' ')}`,
    );
  }
  say(`Installing ${missing.join(' and ')} from Debian`);
  await installFromDebian(missing, signal);
}

export const programsPresent = () => needed.every(({ programs }) => programs.some(onPath));

const onPath = (program) =>
  (process.env.PATH ?? '').split(delimiter).some((folder) => existsSync(join(folder, program)));
