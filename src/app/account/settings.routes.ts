import type { Routes } from '@angular/router';

export const settingsRoutes: Routes = [];
