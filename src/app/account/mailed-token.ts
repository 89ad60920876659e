import { inject } from '@angular/core';
import { ActivatedRoute } from '@angular/router';

/** The secret of a mailed link. It stands after the #, which no server and no log ever sees; the way through sign-in leaves it there. */
export const mailedToken = (): string => inject(ActivatedRoute).snapshot.fragment ?? '';
