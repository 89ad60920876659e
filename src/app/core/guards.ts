import { inject } from '@angular/core';
import { type CanActivateFn, Router } from '@angular/router';
import { Session } from './session';

/** Lets those who are signed in pass; sends others to sign in and then back to where they were going. */
export const forMembers: CanActivateFn = (_route, state) =>
  inject(Session).account() ? true : inject(Router).createUrlTree(['/sign-in'], state.url === '/' ? {} : { queryParams: { next: state.url } });

/** Pages of a household; whoever belongs to none (they left, or were removed) is sent to where one can be made. */
export const forHouseholds: CanActivateFn = () =>
  inject(Session).household() ? true : inject(Router).createUrlTree(['/household']);

/** Pages for those who are not signed in; mailed links (invitations, confirmations, resets) work for everyone. */
export const forStrangers: CanActivateFn = (route) =>
  route.data['forEveryone'] || !inject(Session).account() ? true : inject(Router).createUrlTree(['/scenes']);
