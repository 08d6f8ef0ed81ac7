import { DOCUMENT } from '@angular/common';
import { HttpErrorResponse } from '@angular/common/http';
import { inject } from '@angular/core';
import { type CanActivateFn, RedirectCommand, Router } from '@angular/router';
import { landingPath } from '@contract';
import { SessionStore } from '../api/session-store';
import { safeNext } from './safe-next';

/** Asks who is signed in, which also brings the cookie that proves a form came from this page. */
export const sessionKnown: CanActivateFn = async () => {
  const router = inject(Router);
  try {
    await inject(SessionStore).load();
    return true;
  } catch (error) {
    if (!(error instanceof HttpErrorResponse)) throw error;
    return new RedirectCommand(router.parseUrl('/unreachable'), { skipLocationChange: true });
  }
};

/** Who is signed in already has no use for the page: they go to where they wanted, or to their first page. */
export const notSignedIn: CanActivateFn = (route) => {
  const session = inject(SessionStore).session();
  if (session === null) return true;
  const next = safeNext(
    route.queryParamMap.get('next') ?? undefined,
    inject(DOCUMENT).location.origin,
  );
  return new RedirectCommand(inject(Router).parseUrl(next ?? landingPath(session.roles)));
};
