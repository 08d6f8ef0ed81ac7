import { HttpErrorResponse } from '@angular/common/http';
import { inject } from '@angular/core';
import { type CanActivateFn, RedirectCommand, Router } from '@angular/router';
import { type Session, landingPath, maySee, pages } from '@contract';
import { SessionStore } from '../api/session-store';

type Decide = (session: Session | null) => true | RedirectCommand;

async function decide(store: SessionStore, router: Router, next: Decide) {
  try {
    return next(await store.load());
  } catch (error) {
    if (!(error instanceof HttpErrorResponse)) throw error;
    return new RedirectCommand(router.parseUrl('/unreachable'), { skipLocationChange: true });
  }
}

/** Lets nobody in without a session; signing in leads back to the address that was wanted. */
export const signedIn: CanActivateFn = (_, state) => {
  const router = inject(Router);
  return decide(inject(SessionStore), router, (session) => {
    if (session !== null) return true;
    const queryParams = state.url === '/' ? {} : { next: state.url };
    return new RedirectCommand(router.createUrlTree(['/sign-in'], { queryParams }));
  });
};

/** From the bare address to the page that the person's roles start on. */
export const toLanding: CanActivateFn = () => {
  const router = inject(Router);
  return decide(inject(SessionStore), router, (session) =>
    session === null ? true : new RedirectCommand(router.parseUrl(landingPath(session.roles))),
  );
};

/** Opens a page of the rail to the roles that the access table names, and says so to the others. */
export function pageOpen(path: (typeof pages)[number]['path']): CanActivateFn {
  return () => {
    const router = inject(Router);
    return decide(inject(SessionStore), router, (session) => {
      const page = pages.find((each) => each.path === path);
      if (session === null || (page !== undefined && maySee(page, session.roles))) return true;
      return new RedirectCommand(router.parseUrl('/not-open'), { skipLocationChange: true });
    });
  };
}
