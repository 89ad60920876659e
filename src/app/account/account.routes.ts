import type { Routes } from '@angular/router';

export const accountRoutes: Routes = [
  { path: 'sign-in', title: 'Sign in · Oriel', loadComponent: () => import('./sign-in/sign-in').then((m) => m.SignIn) },
  { path: 'sign-up', title: 'Make a household · Oriel', loadComponent: () => import('./sign-up/sign-up').then((m) => m.SignUp) },
  { path: 'forgotten', title: 'A new password · Oriel', loadComponent: () => import('./ask-reset/ask-reset').then((m) => m.AskReset) },
  { path: 'confirm', data: { forEveryone: true }, title: 'Oriel', loadComponent: () => import('./confirm/confirm').then((m) => m.Confirm) },
  { path: 'reset', data: { forEveryone: true }, title: 'A new password · Oriel', loadComponent: () => import('./reset/reset').then((m) => m.Reset) },
  { path: 'invitation', data: { forEveryone: true }, title: 'Invitation · Oriel', loadComponent: () => import('./invitation/invitation').then((m) => m.InvitationPage) },
];
