import type { Routes } from '@angular/router';

/**
 * Pages under /board: the edition that matters now, all editions, composing one, their history, two side by side, one
 * edition.
 */
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
    path: 'history',
    title: 'History of the standing',
    loadComponent: async () => (await import('./history-page')).HistoryPage,
  },
  {
    path: 'compare/:leftId/:rightId',
    title: 'Two editions side by side',
    loadComponent: async () => (await import('./compare-page')).ComparePage,
  },
  {
    path: ':editionId',
    loadComponent: async () => (await import('./edition-page')).EditionPage,
  },
];
