import type { Routes } from '@angular/router';

/** Pages under /fit. */
export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: 'Fit',
    loadComponent: async () => (await import('./fit-home')).FitHome,
  },
  {
    path: 'from/:peerGroupId',
    title: 'New fit',
    loadComponent: async () => (await import('./fit-home')).FitHome,
  },
  {
    path: 'compare',
    title: 'Two fits',
    loadComponent: async () => (await import('./compare-page')).ComparePage,
  },
  {
    path: ':fitId',
    title: 'Fit',
    loadComponent: async () => (await import('./fit-page')).FitPage,
  },
];
