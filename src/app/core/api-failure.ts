import { HttpErrorResponse } from '@angular/common/http';
import { Failure } from '@oriel/shared/contracts/failure';

/** Of HTTP's refusals those that time or signing in can change: not signed in, too slow, in conflict, too early, too many. */
const passing: readonly number[] = [401, 408, 409, 425, 429];

/** What the page knows of something that went wrong: the server's own words, or ours when it could not be reached. */
export class ApiFailure extends Error {
  constructor(
    /** HTTP status; 0 when the server was not reached. */
    readonly status: number,
    readonly failure: Failure,
  ) {
    super(failure.message);
    this.name = 'ApiFailure';
  }

  get offline(): boolean {
    return this.status === 0;
  }

  /** Whether the same request may yet succeed: what was refused for what it is will be refused again. */
  get mayPass(): boolean {
    return this.status < 400 || this.status >= 500 || passing.includes(this.status);
  }
}

const words = (code: string, message: string, remedy: string): Failure => ({ code, message, remedy, reference: '' });

/** Any thrown thing as an ApiFailure, so that one notice can show it. */
export function toApiFailure(error: unknown): ApiFailure {
  if (error instanceof ApiFailure) return error;
  if (error instanceof HttpErrorResponse) {
    if (error.status === 0)
      return new ApiFailure(0, words('unreachable', 'The server cannot be reached.', 'What you typed is kept. Check the network, then try again.'));
    const parsed = Failure.safeParse(error.error);
    if (parsed.success) return new ApiFailure(error.status, parsed.data);
    return new ApiFailure(error.status, words('not-understood', `The server answered ${error.status}.`, 'Try again in a moment.'));
  }
  return new ApiFailure(-1, words('unexpected', 'Something went wrong on this page.', 'Reload the page and try again.'));
}
