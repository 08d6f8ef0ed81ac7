import type { Routes } from '@angular/router';

/** Pages under /members. */
export const routes: Routes = [
  { path: '', loadComponent: async () => (await import('./members-page')).MembersPage },
];
