import connectPgSimple from 'connect-pg-simple';
import type { RequestHandler } from 'express';
import session from 'express-session';
import { NotSignedIn } from '../errors/app-error';

declare module 'express-session' {
  interface SessionData {
    workspaceId: string;
    /** Milliseconds since 1970. */
    signedInAt: number;
    usedAt: number;
  }
}

const idleMs = 30 * 60_000;
const absoluteMs = 8 * 3_600_000;
/** The time of use is written at most this often: a write on every request would halve the throughput. */
const usedAtPrecisionMs = 60_000;

export interface SessionOptions {
  readonly secrets: readonly string[];
  readonly isLocal: boolean;
  readonly pool: unknown;
  readonly now: () => Date;
}

/** Sessions in PostgreSQL; the cookie holds a random id alone. */
export function sessions(options: SessionOptions): RequestHandler[] {
  const Store = connectPgSimple(session);
  return [
    session({
      name: options.isLocal ? 'sid' : '__Host-sid',
      secret: [...options.secrets],
      resave: false,
      saveUninitialized: false,
      rolling: false,
      unset: 'destroy',
      cookie: {
        secure: !options.isLocal,
        httpOnly: true,
        sameSite: 'lax',
        path: '/',
        maxAge: absoluteMs,
      },
      store: new Store({
        pool: options.pool as never,
        tableName: 'session',
        createTableIfMissing: false,
        pruneSessionInterval: 900,
        disableTouch: true,
      }),
    }),
    limits(options.now),
  ];
}

/** Ends a session 30 minutes after its last use and 8 hours after signing in, on the server. */
function limits(now: () => Date): RequestHandler {
  return (req, _res, next) => {
    const { signedInAt, usedAt } = req.session;
    if (signedInAt === undefined || usedAt === undefined) {
      next();
      return;
    }
    const at = now().getTime();
    if (at - usedAt > idleMs || at - signedInAt > absoluteMs) {
      req.session.destroy((error: unknown) => {
        next(error ?? new NotSignedIn('The session has ended. Sign in again.'));
      });
      return;
    }
    if (at - usedAt > usedAtPrecisionMs) req.session.usedAt = at;
    next();
  };
}
