import { join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The project's folder, whatever folder a command was given in. */
export const root = resolve(fileURLToPath(new URL('..', import.meta.url)));

/** @param {...string} parts a path inside the project */
export const inProject = (...parts) => join(root, ...parts);

/** What Oriel keeps on this machine and never commits: database, secret, photographs, logs. */
export const stateFolder = inProject('.oriel');
