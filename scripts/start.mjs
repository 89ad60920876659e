import { requireNode } from './node-version.mjs';

requireNode();
const { start } = await import('./start/start.mjs');
process.exit(await start());
