import type { Routes } from '@angular/router';

const loadPanelPage = async () => (await import('./panel-page')).PanelPage;

/** Pages under /panel; without an id stands the newest panel version. */
export const routes: Routes = [
  { path: '', pathMatch: 'full', loadComponent: loadPanelPage },
  {
    path: 'import/:importId',
    title: 'Bring in a panel',
    loadComponent: async () => (await import('./importing/import-page')).ImportPage,
  },
  { path: ':panelVersionId', loadComponent: loadPanelPage },
];
