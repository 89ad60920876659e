import { provideHttpClient } from '@angular/common/http';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { Session } from '../../core/session';
import { PhotoLibrary } from '../photo-library';
import { PhotosPage } from './photos-page';

describe('the photos page', () => {
  it('answers what was typed last, though it was typed while an earlier answer was on its way', async () => {
    const asked: string[] = [];
    const answers: (() => void)[] = [];
    const library = {
      photos: signal([]),
      total: signal(0),
      loaded: signal(false),
      rest: () => Promise.resolve(),
      open: (search: string) => new Promise<void>((resolve) => (asked.push(search), answers.push(resolve))),
    };
    TestBed.configureTestingModule({
      providers: [
        provideRouter([]),
        provideHttpClient(),
        { provide: PhotoLibrary, useValue: library },
        { provide: Session, useValue: { household: signal(null), account: signal(null) } },
      ],
    });
    vi.useFakeTimers();
    const page = TestBed.runInInjectionContext(() => new PhotosPage());
    page.ngOnInit();
    page['searchFor']('lake');
    await vi.advanceTimersByTimeAsync(1000);
    answers[0]();
    await vi.advanceTimersByTimeAsync(0);
    vi.useRealTimers();
    expect(asked).toEqual(['', 'lake']);
  });
});
