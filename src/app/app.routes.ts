import type { Routes } from '@angular/router';
import { pageOpen, signedIn, toLanding } from './shell/session-guards';

/**
 * Every feature is lazy; its own file holds the pages under its path. The shell frames all that needs a session.
 * Ids stand in paths and queries, amounts never do.
 */
export const routes: Routes = [
  {
    path: '',
    canActivate: [signedIn],
    loadComponent: async () => (await import('./shell/shell')).Shell,
    children: [
      { path: '', pathMatch: 'full', canActivate: [toLanding], children: [] },
      {
        path: 'panel',
        title: 'Panel',
        canActivate: [pageOpen('panel')],
        loadChildren: async () => (await import('./panels/panels.routes')).routes,
      },
      {
        path: 'peers',
        title: 'Peers',
        canActivate: [pageOpen('peers')],
        loadChildren: async () => (await import('./peers/peers.routes')).routes,
      },
      {
        path: 'fit',
        title: 'Fit',
        canActivate: [pageOpen('fit')],
        loadChildren: async () => (await import('./fits/fits.routes')).routes,
      },
      {
        path: 'scenarios',
        title: 'Scenarios',
        canActivate: [pageOpen('scenarios')],
        loadChildren: async () => (await import('./scenarios/scenarios.routes')).routes,
      },
      {
        path: 'board',
        title: 'Board',
        canActivate: [pageOpen('board')],
        loadChildren: async () => (await import('./board/board.routes')).routes,
      },
      {
        path: 'seats',
        title: 'Seats',
        canActivate: [pageOpen('seats')],
        loadChildren: async () => (await import('./billing/billing.routes')).routes,
      },
      {
        path: 'members',
        title: 'Members',
        canActivate: [pageOpen('members')],
        loadChildren: async () => (await import('./members/members.routes')).routes,
      },
      {
        path: 'not-open',
        title: 'Not open to your roles',
        loadComponent: async () => (await import('./shell/notice-pages')).NotOpen,
      },
    ],
  },
  {
    path: 'unreachable',
    title: 'No answer',
    loadComponent: async () => (await import('./shell/notice-pages')).Unreachable,
  },
  // sign-in, sign-up and join stand at the root of the address.
  {
    path: '',
    loadChildren: async () => (await import('./account/account.routes')).routes,
  },
  {
    path: '**',
    title: 'No such page',
    loadComponent: async () => (await import('./shell/notice-pages')).NotFound,
  },
];
