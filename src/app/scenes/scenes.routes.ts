import type { Routes } from '@angular/router';

export const scenesRoutes: Routes = [
  { path: '', title: 'Scenes · Oriel', loadComponent: () => import('./scenes-page/scenes-page').then((m) => m.ScenesPage) },
];
