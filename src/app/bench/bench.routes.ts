import { inject } from '@angular/core';
import type { CanMatchFn, Routes } from '@angular/router';
import { Session } from '../core/session';
import { BenchSubject } from './subject/bench-subject';

/** The bench is for owners and tuners; whoever else comes by its address is told so. */
const forTuners: CanMatchFn = () => inject(Session).mayTune();
const forOthers: CanMatchFn = () => !inject(Session).mayTune();

export const benchRoutes: Routes = [
  {
    path: '',
    canMatch: [forTuners],
    providers: [BenchSubject],
    loadComponent: () => import('./bench-page/bench-page').then((m) => m.BenchPage),
    children: [
      {
        path: '',
        pathMatch: 'full',
        title: 'Bench · Oriel',
        loadComponent: () => import('./live/live-page').then((m) => m.LivePage),
      },
      { path: 'runs', title: 'Runs · Oriel', loadComponent: () => import('./runs/runs-page').then((m) => m.RunsPage) },
      {
        path: 'runs/compare',
        title: 'Two runs · Oriel',
        loadComponent: () => import('./runs/compare-page').then((m) => m.ComparePage),
      },
      {
        path: 'runs/:runId',
        title: 'Replay · Oriel',
        loadComponent: () => import('./replay/replay-page').then((m) => m.ReplayPage),
      },
      {
        path: 'mirror',
        title: 'Mirror test · Oriel',
        loadComponent: () => import('./mirror/mirror-page').then((m) => m.MirrorPage),
      },
    ],
  },
  { path: '**', title: 'Bench · Oriel', canMatch: [forOthers], loadComponent: () => import('./bench-page/not-for-you').then((m) => m.NotForYou) },
];
