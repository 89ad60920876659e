import type { Routes } from '@angular/router';

export const playerRoutes: Routes = [];
