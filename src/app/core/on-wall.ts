import { DOCUMENT, inject } from '@angular/core';
import { NEVER, type Observable, timer } from 'rxjs';

/** Whether this page was opened as a wall's screen, which has no account and must start without a network. Needs an injection context. */
export const onWall = (): boolean => inject(DOCUMENT).location.pathname === '/wall';

/** What a wall keeps for a start without a network is fetched once it shows something: it would only be in the way before. */
const afterMs = 3000;

/** The service worker is for walls alone: everyone else's pages come from the server, and are never older than it. */
export const whenOnWall = (): Observable<unknown> => (location.pathname === '/wall' ? timer(afterMs) : NEVER);
