import type { Routes } from '@angular/router';

/** sign-in, sign-up and join: paths at the root of the address. */
export const routes: Routes = [];
