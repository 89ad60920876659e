/** Permissive or weakly copyleft licences and data licences, by SPDX identifier: they may be shipped with, or used by, an MIT project. */
const allowed = new Set([
  ...[
    '0BSD',
    'Apache-2.0',
    'BlueOak-1.0.0',
    'BSD-2-Clause',
    'BSD-3-Clause',
    'ISC',
    'MIT',
    'MIT-0',
    'Python-2.0',
    'Unlicense',
    'Zlib',
  ],
  ...['LGPL-2.1-or-later', 'LGPL-3.0', 'LGPL-3.0-only', 'LGPL-3.0-or-later', 'MPL-2.0'],
  ...['CC0-1.0', 'CC-BY-3.0', 'CC-BY-4.0'],
]);

/**
 * Whether an SPDX expression can be met by the licences above: all sides of AND, one side of OR.
 * @param {string} expression e.g. `(MIT OR CC0-1.0)`
 */
export function mayUse(expression) {
  const plain = expression.replace(/[()]/g, '');
  return plain.split(' OR ').some((side) => side.split(' AND ').every((licence) => allowed.has(licence.trim())));
}
