import type { Routes } from '@angular/router';

/** Pages under /scenarios. */
export const routes: Routes = [];
