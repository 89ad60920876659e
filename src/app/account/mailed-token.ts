import { inject } from '@angular/core';
import { ActivatedRoute } from '@angular/router';
import { Token } from '@oriel/shared/contracts/fields';
import { ApiFailure } from '../core/api-failure';

/** The secret of a mailed link. It stands after the #, which no server and no log ever sees; the way through sign-in leaves it there. */
export const mailedToken = (): string => inject(ActivatedRoute).snapshot.fragment ?? '';

/** The secret, if all of it is there. @throws ApiFailure where the link was cut short, as some mail programs do. */
export function wholeToken(token: string): string {
  if (Token.safeParse(token).success) return token;
  throw new ApiFailure(400, {
    code: 'link-cut-short',
    message: 'A part of this link is missing.',
    remedy: 'Open it from the message itself, or copy all of it: it may run over two lines.',
    reference: '',
  });
}
