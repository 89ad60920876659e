import type { Routes } from '@angular/router';
import { forHouseholds, forMembers, forStrangers } from './core/guards';

export const routes: Routes = [
  { path: 'play/:sceneId', canActivate: [forMembers], loadChildren: () => import('./player/player.routes').then((m) => m.playerRoutes) },
  { path: 'wall', loadChildren: () => import('./wall/wall.routes').then((m) => m.wallRoutes) },
  {
    path: '',
    canActivate: [forMembers],
    loadComponent: () => import('./shell/shell').then((m) => m.Shell),
    children: [
      { path: '', pathMatch: 'full', redirectTo: 'scenes' },
      { path: 'scenes', canActivate: [forHouseholds], loadChildren: () => import('./scenes/scenes.routes').then((m) => m.scenesRoutes) },
      { path: 'photos', canActivate: [forHouseholds], loadChildren: () => import('./photos/photos.routes').then((m) => m.photosRoutes) },
      { path: 'walls', canActivate: [forHouseholds], loadChildren: () => import('./walls/walls.routes').then((m) => m.wallsRoutes) },
      { path: 'bench', canActivate: [forHouseholds], loadChildren: () => import('./bench/bench.routes').then((m) => m.benchRoutes) },
      { path: 'household', loadChildren: () => import('./household/household.routes').then((m) => m.householdRoutes) },
      { path: 'compose/:sceneId', loadChildren: () => import('./composer/composer.routes').then((m) => m.composerRoutes) },
      { path: 'screen', loadChildren: () => import('./screen/screen.routes').then((m) => m.screenRoutes) },
      { path: 'account', loadChildren: () => import('./account/settings.routes').then((m) => m.settingsRoutes) },
    ],
  },
  { path: '', canActivateChild: [forStrangers], loadChildren: () => import('./account/account.routes').then((m) => m.accountRoutes) },
  { path: '**', loadComponent: () => import('./shell/not-found').then((m) => m.NotFound) },
];
