import type { Routes } from '@angular/router';
import { notSignedIn, sessionKnown } from './account-guards';

/** sign-in, sign-up and join: paths at the root of the address. */
export const routes: Routes = [
  {
    path: 'sign-in',
    title: 'Sign in',
    canActivate: [sessionKnown, notSignedIn],
    loadComponent: async () => (await import('./sign-in-page')).SignInPage,
  },
  {
    path: 'sign-up',
    title: 'Create a workspace',
    canActivate: [sessionKnown, notSignedIn],
    loadComponent: async () => (await import('./sign-up-page')).SignUpPage,
  },
  {
    path: 'join',
    title: 'Join a workspace',
    canActivate: [sessionKnown],
    loadComponent: async () => (await import('./join-page')).JoinPage,
  },
];
