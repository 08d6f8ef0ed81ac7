import type { Routes, UrlMatchResult, UrlSegment } from '@angular/router';

/**
 * Pages under /scenarios: a new plan, or `:scenarioId`, and `compare?of=id,id`. The first two are one route, so that
 * saving a new plan keeps the page.
 */
export const routes: Routes = [
  {
    path: 'compare',
    loadComponent: async () => (await import('./results/compare-page')).ComparePage,
  },
  {
    matcher: newOrSaved,
    loadComponent: async () => (await import('./scenarios-page')).ScenariosPage,
  },
];

function newOrSaved(segments: UrlSegment[]): UrlMatchResult | null {
  if (segments.length > 1) return null;
  return segments.length === 0
    ? { consumed: [] }
    : { consumed: segments, posParams: { scenarioId: segments[0] } };
}
