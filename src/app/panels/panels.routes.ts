import { inject } from '@angular/core';
import type { CanDeactivateFn, Routes } from '@angular/router';
import { UnsavedEdits } from './editing/unsaved-edits';

const mayLeave: CanDeactivateFn<unknown> = () => inject(UnsavedEdits).mayLeave();

const panelPage = {
  canDeactivate: [mayLeave],
  loadComponent: async () => (await import('./panel-page')).PanelPage,
};

/** Pages under /panel; without an id stands the newest panel version. */
export const routes: Routes = [
  { path: '', pathMatch: 'full', ...panelPage },
  {
    path: 'import/:importId',
    title: 'Bring in a panel',
    loadComponent: async () => (await import('./importing/import-page')).ImportPage,
  },
  { path: ':panelVersionId', ...panelPage },
];
