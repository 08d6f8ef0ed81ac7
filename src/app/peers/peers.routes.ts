import type { CanDeactivateFn, Routes, UrlMatcher } from '@angular/router';
import type { PeersPage } from './peers-page';

/** One route with and without an id, so that saving goes on in the same page. */
const versionOrNewest: UrlMatcher = (segments) => {
  if (segments.length > 1) return null;
  return segments.length === 0
    ? { consumed: segments }
    : { consumed: segments, posParams: { peerGroupId: segments[0] } };
};

const mayLeave: CanDeactivateFn<PeersPage> = (page) => page.mayLeave();

/** Pages under /peers. */
export const routes: Routes = [
  {
    path: 'compare',
    title: 'Two versions of the peers',
    loadComponent: async () => (await import('./compare/compare-page')).PeerComparePage,
  },
  {
    matcher: versionOrNewest,
    title: 'Peers',
    canDeactivate: [mayLeave],
    loadComponent: async () => (await import('./peers-page')).PeersPage,
  },
];
