import type { Routes } from '@angular/router';

/** Pages under /peers. */
export const routes: Routes = [];
