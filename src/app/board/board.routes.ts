import type { Routes } from '@angular/router';

/** Pages under /board: the edition that matters now, all editions, publishing one, one edition. */
export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    data: { isLanding: true },
    loadComponent: async () => (await import('./editions-page')).EditionsPage,
  },
  {
    path: 'editions',
    loadComponent: async () => (await import('./editions-page')).EditionsPage,
  },
  {
    path: 'publish',
    title: 'Publish an edition',
    loadComponent: async () => (await import('./publish-page')).PublishPage,
  },
  {
    path: ':editionId',
    loadComponent: async () => (await import('./edition-page')).EditionPage,
  },
];
