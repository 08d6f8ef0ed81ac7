import type { Routes } from '@angular/router';

/** Pages under /panel. */
export const routes: Routes = [];
