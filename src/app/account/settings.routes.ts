import type { Routes } from '@angular/router';

export const settingsRoutes: Routes = [
  { path: '', title: 'Your account · Oriel', loadComponent: () => import('./settings/settings').then((m) => m.Settings) },
];
