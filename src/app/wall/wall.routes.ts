import type { Routes } from '@angular/router';
import { Wall } from './wall';

export const wallRoutes: Routes = [{ path: '', component: Wall, title: 'Wall · Oriel' }];
