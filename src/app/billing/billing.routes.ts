import type { Routes } from '@angular/router';

/** Pages under /seats. */
export const routes: Routes = [
  { path: '', loadComponent: async () => (await import('./seats-page')).SeatsPage },
];
