import type { Routes } from '@angular/router';

export const composerRoutes: Routes = [];
