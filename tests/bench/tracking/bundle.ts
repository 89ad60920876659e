import { build } from 'esbuild';
import { fileURLToPath } from 'node:url';

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

/** Builds the tracking worker as the product ships it, the reference's worker and the page that replays, into a folder. */
export async function bundleBench(folder: string): Promise<void> {
  await build({
    entryPoints: {
      'tracking.worker': here('../../../src/app/tracking/tracking.worker.ts'),
      'reference.worker': here('./reference.worker.ts'),
      'bench-page': here('./bench-page.ts'),
    },
    outdir: folder,
    bundle: true,
    minify: true,
    format: 'esm',
    platform: 'browser',
    target: 'es2022',
    logLevel: 'error',
    tsconfig: here('../../../tsconfig.json'),
    alias: {
      '@mediapipe/face_mesh': here('./no-mediapipe.ts'),
      '@mediapipe/face_detection': here('./no-mediapipe.ts'),
    },
  });
}
