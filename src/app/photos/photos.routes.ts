import type { Routes } from '@angular/router';

const loadComponent = () => import('./photos-page/photos-page').then((m) => m.PhotosPage);

export const photosRoutes: Routes = [
  { path: '', title: 'Photos · Oriel', loadComponent },
  { path: 'bin', title: 'Bin · Oriel', data: { bin: true }, loadComponent },
];
