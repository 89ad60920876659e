import type { Routes } from '@angular/router';

export const householdRoutes: Routes = [
  { path: '', title: 'Household · Oriel', loadComponent: () => import('./household-page/household-page').then((m) => m.HouseholdPage) },
];
