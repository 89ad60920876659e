import { APP_BASE_HREF } from '@angular/common';
import { provideHttpClient } from '@angular/common/http';
import { type ApplicationConfig, inject, isDevMode, provideAppInitializer, provideBrowserGlobalErrorListeners, provideZonelessChangeDetection } from '@angular/core';
import { ErrorStateMatcher } from '@angular/material/core';
import { MAT_FORM_FIELD_DEFAULT_OPTIONS } from '@angular/material/form-field';
import { provideRouter, withComponentInputBinding, withInMemoryScrolling, withViewTransitions } from '@angular/router';
import { provideServiceWorker } from '@angular/service-worker';
import { routes } from './app.routes';
import { Session } from './core/session';
import { Light } from './core/light';
import { onWall, whenOnWall } from './core/on-wall';

export const appConfig: ApplicationConfig = {
  providers: [
    provideBrowserGlobalErrorListeners(),
    provideZonelessChangeDetection(),
    // In place of a <base> element, which the content security policy forbids (OWASP ASVS 5.0.0, 3.4.3).
    { provide: APP_BASE_HREF, useValue: '/' },
    provideHttpClient(),
    provideRouter(routes, withComponentInputBinding(), withViewTransitions({ skipInitialTransition: true }), withInMemoryScrolling({ scrollPositionRestoration: 'enabled' })),
    { provide: MAT_FORM_FIELD_DEFAULT_OPTIONS, useValue: { appearance: 'outline', subscriptSizing: 'dynamic' } },
    // Sending marks every field as touched; once a form is sent and emptied, its fields are no mistakes.
    { provide: ErrorStateMatcher, useValue: { isErrorState: (control) => !!control?.invalid && control.touched } satisfies ErrorStateMatcher },
    provideServiceWorker('wall-worker.js', { enabled: !isDevMode(), registrationStrategy: whenOnWall }),
    provideAppInitializer(() => {
      inject(Light);
      return onWall() ? undefined : inject(Session).load();
    }),
  ],
};
