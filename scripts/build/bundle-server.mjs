import { rmSync } from 'node:fs';
import { inProject, root } from '../project.mjs';

/** Bundles server, shared and migrations into dist/server/main.js; packages stay in node_modules. */
export async function bundleServer() {
  const { build } = await import('esbuild');
  rmSync(inProject('dist/server'), { recursive: true, force: true });
  await build({
    absWorkingDir: root,
    entryPoints: ['server/main.ts'],
    outfile: 'dist/server/main.js',
    alias: { '@oriel/shared': inProject('shared') },
    bundle: true,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    packages: 'external',
    sourcemap: true,
    logLevel: 'silent',
  });
}
