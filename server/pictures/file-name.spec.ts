import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { Name } from '@oriel/shared/contracts/fields';
import { photoName, titleFrom, titleOfCopy } from './file-name';

describe('names', () => {
  it('are those of the file, and of what is made from it', () => {
    expect(photoName('holiday/../IMG_1.JPG')).toBe('IMG_1.JPG');
    expect(titleFrom('IMG_1.final.JPG')).toBe('IMG_1.final');
    expect(titleFrom('.jpg')).toBe('Untitled');
    expect(titleFrom('Dr. Alder at home')).toBe('Dr. Alder at home');
    expect(titleOfCopy('Harbour')).toBe('Harbour copy');
  });

  it('are never cut through a character', () => {
    expect(photoName(`${'a'.repeat(199)}😀.jpg`)).toBe('a'.repeat(199));
    expect(titleFrom(`${'a'.repeat(119)}😀`)).toBe('a'.repeat(119));
  });

  it('security: fit what a scene may be called, whatever a file is called', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 300 }), (path) => {
        const name = photoName(path);
        const title = titleFrom(name);
        for (const text of [title, titleOfCopy(title)]) expect(Name.parse(text)).toBe(text);
        expect(name).not.toMatch(/[/\\\p{Cc}\p{Cs}]/u);
      }),
      { numRuns: 2000 },
    );
  });
});
