import { DOCUMENT, inject } from '@angular/core';
import { NEVER, type Observable, of } from 'rxjs';

/** Whether this page was opened as a wall's screen, which has no account and must start without a network. Needs an injection context. */
export const onWall = (): boolean => inject(DOCUMENT).location.pathname === '/wall';

/** The service worker is for walls alone: everyone else's pages come from the server, and are never older than it. */
export const whenOnWall = (): Observable<void> => (location.pathname === '/wall' ? of(undefined) : NEVER);
