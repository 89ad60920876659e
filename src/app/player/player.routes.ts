import type { Routes } from '@angular/router';
import { Player } from './player';

export const playerRoutes: Routes = [{ path: '', component: Player }];
