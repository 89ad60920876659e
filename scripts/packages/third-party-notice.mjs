import { lockedPackages } from './locked-packages.mjs';

const marker = '<!-- From here on written by `node scripts/third-party.mjs`. -->';

/**
 * THIRD-PARTY.md with its list of packages brought up to date; what stands above the marker is kept.
 * @param {string} present
 */
export function thirdParty(present) {
  const byHand = present.split(marker)[0].trimEnd();
  const rows = lockedPackages()
    .filter(({ production }) => production)
    .map(({ name, version, licence }) => `| ${name} | ${version} | ${licence} |`);
  return [byHand, '', marker, '', '| package | version | licence |', '| --- | --- | --- |', ...rows, ''].join('\n');
}
