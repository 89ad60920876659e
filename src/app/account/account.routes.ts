import type { Routes } from '@angular/router';

export const accountRoutes: Routes = [];
