import type { Routes } from '@angular/router';

export const scenesRoutes: Routes = [];
