import type { Routes } from '@angular/router';

export const scenesRoutes: Routes = [
  { path: 'bin', title: 'Bin · Oriel', loadComponent: () => import('./scenes-bin/scenes-bin').then((m) => m.ScenesBin) },
  { path: '', title: 'Scenes · Oriel', loadComponent: () => import('./scenes-page/scenes-page').then((m) => m.ScenesPage) },
];
