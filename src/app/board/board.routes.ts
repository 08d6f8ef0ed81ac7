import type { Routes } from '@angular/router';

/** Pages under /board. */
export const routes: Routes = [];
