import type { Routes } from '@angular/router';

export const householdRoutes: Routes = [];
