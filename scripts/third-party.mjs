import { readFileSync, writeFileSync } from 'node:fs';
import { thirdParty } from './packages/third-party-notice.mjs';
import { inProject } from './project.mjs';

const file = inProject('THIRD-PARTY.md');
writeFileSync(file, thirdParty(readFileSync(file, 'utf8')));
