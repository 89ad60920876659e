import type { Routes } from '@angular/router';
import { ScreenPage } from './screen-page';

export const screenRoutes: Routes = [{ path: '', component: ScreenPage, title: 'This screen · Oriel' }];
