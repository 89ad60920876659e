import { parseArgs } from 'node:util';
import { FACE_PATHS } from './face-path';
import { makeFaceVideo, testFace } from './face-video';

const USAGE = 'npm run video:face -- --path train|held --out FILE (without ending)';

async function main(): Promise<void> {
  const { values } = parseArgs({ options: { path: { type: 'string', default: 'train' }, out: { type: 'string' } } });
  const path = FACE_PATHS[values.path];
  if (!path || !values.out) throw new Error(`Say which path and where to write: ${USAGE}`);
  const poses = path();
  await makeFaceVideo(values.out, await testFace(), poses);
  console.log(`${String(poses.length)} frames in ${values.out}.mjpeg, their truth in ${values.out}.json`);
}

main().catch((cause: unknown) => {
  console.error(cause instanceof Error ? cause.message : cause);
  process.exitCode = 1;
});
