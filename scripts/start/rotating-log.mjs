import { closeSync, existsSync, mkdirSync, openSync, renameSync, statSync, writeSync } from 'node:fs';
import { dirname } from 'node:path';

const largest = 20 * 1024 * 1024;

/**
 * A log for one reader of this machine that never takes more than two times 20 MB: when full, it becomes `FILE.1` and a new one begins.
 * @param {string} file
 */
export function rotatingLog(file) {
  mkdirSync(dirname(file), { recursive: true });
  let size = existsSync(file) ? statSync(file).size : 0;
  let opened = openSync(file, 'a', 0o600);
  return {
    /** @param {Buffer} chunk */
    write(chunk) {
      if (size + chunk.length > largest) {
        closeSync(opened);
        renameSync(file, `${file}.1`);
        opened = openSync(file, 'a', 0o600);
        size = 0;
      }
      size += writeSync(opened, chunk);
    },
    close: () => closeSync(opened),
  };
}
