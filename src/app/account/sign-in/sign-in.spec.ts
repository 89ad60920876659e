import { provideHttpClient } from '@angular/common/http';
import { provideHttpClientTesting } from '@angular/common/http/testing';
import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Router, provideRouter, withComponentInputBinding } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { Api } from '../../core/api';
import { SignIn } from './sign-in';

@Component({ template: '', changeDetection: ChangeDetectionStrategy.OnPush })
class AnyPage {}

describe('signing in', () => {
  const goOnFrom = async (address: string): Promise<string> => {
    const account = { id: 'ada', name: 'Ada', email: 'ada@example.org', memberships: [] };
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(),
        provideHttpClientTesting(),
        provideRouter([{ path: 'sign-in', component: SignIn }, { path: '**', component: AnyPage }], withComponentInputBinding()),
        { provide: Api, useValue: { call: () => Promise.resolve({ account }) } },
      ],
    });
    const page = await (await RouterTestingHarness.create()).navigateByUrl(address, SignIn);
    page['form'].setValue({ email: account.email, password: 'plaster ink brass' });
    await page['signIn']();
    return TestBed.inject(Router).url;
  };

  it('goes on to where one was going', async () => {
    expect(await goOnFrom('/sign-in?next=%2Fphotos%3Fbin%3D1')).toBe('/photos?bin=1');
  });

  it('security: carries a mailed secret after the #, where no server sees it', async () => {
    expect(await goOnFrom('/sign-in?next=%2Finvitation#secret')).toBe('/invitation#secret');
  });

  it('security: goes nowhere else', async () => {
    expect(await goOnFrom('/sign-in?next=%2F%2Felsewhere.example')).toBe('/scenes');
  });
});
