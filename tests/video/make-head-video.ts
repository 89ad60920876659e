import { resolve } from 'node:path';
import { parseArgs } from 'node:util';
import { PEOPLE, testHeads } from './head-from-photograph';
import { HEAD_PATHS, headPath } from './head-path';
import { makeHeadVideo } from './head-video';

const USAGE = `npm run video:heads -- --path ${HEAD_PATHS.join('|')} --out FILE (without ending) [--who 0|1|2] [--glasses]`;
/** npm runs scripts in the project's folder; files are meant as seen from where it was called. */
const CALLED_FROM = process.env['INIT_CWD'] ?? '.';

async function main(): Promise<void> {
  const { values } = parseArgs({
    options: {
      path: { type: 'string', default: 'turn1' },
      out: { type: 'string' },
      who: { type: 'string', default: '0' },
      glasses: { type: 'boolean', default: false },
    },
  });
  const path = headPath(values.path, Number(values.who));
  if (!path || !values.out || !(Number(values.who) in PEOPLE))
    throw new Error(`Say which path, which person and where to write: ${USAGE}`);
  const heads = await testHeads(PEOPLE.map((person) => ({ ...person, glasses: values.glasses })));
  const frames = await makeHeadVideo(resolve(CALLED_FROM, values.out), heads, path);
  console.log(`${String(frames)} frames in ${values.out}.mjpeg, their truth in ${values.out}.json`);
}

main().catch((cause: unknown) => {
  console.error(cause instanceof Error ? cause.message : cause);
  process.exitCode = 1;
});
