import type { Routes } from '@angular/router';
import { BoardPage } from './board-page/board-page';
import { KioskPage } from './kiosk-page/kiosk-page';
import { SetUpPage } from './set-up/set-up-page';
import { WallsPage } from './walls-page/walls-page';

export const wallsRoutes: Routes = [
  { path: '', component: WallsPage, title: 'Walls · Oriel' },
  { path: 'board', component: BoardPage, title: 'Board for measuring a camera · Oriel' },
  { path: ':wallId', component: SetUpPage, title: 'Wall · Oriel' },
  { path: ':wallId/kiosk', component: KioskPage, title: 'A computer for this wall · Oriel' },
];
