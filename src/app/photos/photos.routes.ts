import type { Routes } from '@angular/router';

export const photosRoutes: Routes = [];
