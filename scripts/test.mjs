import { requireNode } from './node-version.mjs';

requireNode();
const { test } = await import('./test/test.mjs');
process.exit(await test());
