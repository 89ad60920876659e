import { bundleServer } from './build/bundle-server.mjs';

await bundleServer();
