import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { mayUse } from '../../scripts/packages/licences.mjs';
import { lockedPackages } from '../../scripts/packages/locked-packages.mjs';
import { thirdParty } from '../../scripts/packages/third-party-notice.mjs';
import { inProject } from '../../scripts/project.mjs';

const read = (path: string) => readFileSync(inProject(path), 'utf8');

describe('the packages Oriel installs', () => {
  test('are under permissive or weakly copyleft licences', () => {
    const refused = lockedPackages().filter(({ licence }) => !mayUse(licence));
    expect(refused).toEqual([]);
    expect(lockedPackages().length).toBeGreaterThan(300);
  });

  test('are listed in THIRD-PARTY.md as they are locked (else: node scripts/third-party.mjs)', () => {
    expect(thirdParty(read('THIRD-PARTY.md'))).toBe(read('THIRD-PARTY.md'));
  });

  test('are pinned exactly', () => {
    const { dependencies, devDependencies } = JSON.parse(read('package.json')) as Record<
      string,
      Record<string, string>
    >;
    const loose = Object.entries({ ...dependencies, ...devDependencies }).filter(
      ([, version]) => !/^\d+\.\d+\.\d+(-[\w.]+)?$/.test(version),
    );
    expect(loose).toEqual([]);
  });

  test('are locked by their contents, not by where they were fetched', () => {
    const { packages } = JSON.parse(read('package-lock.json')) as {
      packages: Record<string, { integrity?: string; resolved?: string }>;
    };
    const entries = Object.entries(packages).filter(([path]) => path !== '');
    expect(entries.filter(([, { resolved }]) => resolved)).toEqual([]);
    expect(entries.filter(([, { integrity }]) => !integrity?.startsWith('sha512-')).map(([path]) => path)).toEqual([]);
  });
});

// The SPDX specification 2.3, annex D: OR gives the choice, AND asks for both.
describe('licence expressions', () => {
  test.each([
    ['MIT', true],
    ['(MIT OR GPL-3.0-only)', true],
    ['Apache-2.0 AND LGPL-3.0-or-later AND MIT', true],
    ['MIT AND GPL-3.0-only', false],
    ['GPL-2.0', false],
    ['unknown', false],
    ['SEE LICENSE IN LICENSE', false],
  ])('%s', (expression, expected) => expect(mayUse(expression)).toBe(expected));
});
