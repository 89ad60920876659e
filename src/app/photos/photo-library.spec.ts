import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { Photo } from '@oriel/shared/contracts/photos';
import { Api } from '../core/api';
import { Session } from '../core/session';
import { PhotoLibrary } from './photo-library';
import { somePhoto } from './testing';

describe('the photo library', () => {
  let library: PhotoLibrary;
  const page = { photos: [] as Photo[], next: null as string | null, total: 0 };
  const names = () => library.photos().map(({ name }) => name);

  beforeEach(() => {
    TestBed.configureTestingModule({
      providers: [
        PhotoLibrary,
        { provide: Api, useValue: { call: () => Promise.resolve(page) } },
        { provide: Session, useValue: { household: signal(null), householdId: () => 'here' } },
      ],
    });
    library = TestBed.inject(PhotoLibrary);
  });

  it('takes an uploaded photo in at its place by date', async () => {
    Object.assign(page, { photos: [somePhoto('May', '2024-05-01'), somePhoto('March', '2024-03-01')], next: null, total: 2 });
    await library.open('', false);
    library.take(somePhoto('April', '2024-04-01'));
    library.take(somePhoto('January', '2024-01-01'));
    expect(names()).toEqual(['May', 'April', 'March', 'January']);
    expect(library.total()).toBe(4);
  });

  it('leaves a photo older than what is fetched to the page it comes with', async () => {
    Object.assign(page, { photos: [somePhoto('May', '2024-05-01')], next: 'more', total: 2 });
    await library.open('', false);
    library.take(somePhoto('of 1990', '1990-01-01'));
    expect(names()).toEqual(['May']);
    Object.assign(page, { photos: [somePhoto('March', '2024-03-01'), somePhoto('of 1990', '1990-01-01')], next: null, total: 3 });
    await library.more();
    expect(names()).toEqual(['May', 'March', 'of 1990']);
  });

  it('fetches all there is, page after page, and what is asked meanwhile instead', async () => {
    Object.assign(page, { photos: [somePhoto('May', '2024-05-01')], next: 'more', total: 2 });
    await library.open('', false);
    expect(library.hasMore()).toBe(true);
    Object.assign(page, { photos: [somePhoto('March', '2024-03-01')], next: null });
    await library.rest();
    expect(names()).toEqual(['May', 'March']);
    expect(library.hasMore()).toBe(false);

    Object.assign(page, { photos: [somePhoto('May', '2024-05-01')], next: 'more' });
    await library.open('', false);
    const all = library.rest();
    Object.assign(page, { photos: [somePhoto('Lake', '2020-07-01')], next: null, total: 1 });
    await library.open('lake', false);
    await all;
    expect(names()).toEqual(['Lake']);
  });
});
