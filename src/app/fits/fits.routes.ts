import type { Routes } from '@angular/router';

/** Pages under /fit. */
export const routes: Routes = [];
