import type { Routes } from '@angular/router';

export const composerRoutes: Routes = [{ path: '', loadComponent: () => import('./composer').then((m) => m.Composer) }];
