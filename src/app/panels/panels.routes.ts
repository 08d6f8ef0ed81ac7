import { inject } from '@angular/core';
import type { CanDeactivateFn, Routes, UrlMatcher } from '@angular/router';
import { UnsavedEdits } from './editing/unsaved-edits';

const mayLeave: CanDeactivateFn<unknown> = () => inject(UnsavedEdits).mayLeave();

/** With or without an id it is one page, which goes on from the newest version to the one that it makes of it. */
const panelVersion: UrlMatcher = (segments) => {
  if (segments.length > 1) return null;
  return { consumed: segments, posParams: segments[0] && { panelVersionId: segments[0] } };
};

/** Pages under /panel; without an id stands the newest panel version. */
export const routes: Routes = [
  {
    path: 'import/:importId',
    title: 'Bring in a panel',
    loadComponent: async () => (await import('./importing/import-page')).ImportPage,
  },
  {
    matcher: panelVersion,
    canDeactivate: [mayLeave],
    loadComponent: async () => (await import('./panel-page')).PanelPage,
  },
];
