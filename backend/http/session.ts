import connectPgSimple from 'connect-pg-simple';
import type { RequestHandler } from 'express';
import session from 'express-session';

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

/** What the store needs of its pool. */
export interface SessionPool {
  query(text: string, values: unknown[]): Promise<unknown>;
}

export interface SessionOptions {
  readonly secrets: readonly string[];
  readonly isLocal: boolean;
  readonly pool: SessionPool;
  readonly now: () => Date;
}

/** Sessions in PostgreSQL; the cookie holds a random id alone. */
export function sessions(options: SessionOptions): RequestHandler[] {
  const Store = sessionStore(options.pool);
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

/**
 * The package's store, but for one thing: only signing in makes a row. A slow request that ends after its session was
 * destroyed updates nothing, where the package would write the row anew and so bring the session back.
 */
function sessionStore(pool: SessionPool) {
  return class extends connectPgSimple(session) {
    override set(
      sid: string,
      data: session.SessionData,
      done: (error?: unknown) => void = () => undefined,
    ): void {
      const { signedInAt, usedAt } = data;
      if (usedAt === undefined || signedInAt === undefined || usedAt === signedInAt) {
        super.set(sid, data, done);
        return;
      }
      const expire = new Date(Date.now() + (data.cookie.maxAge ?? absoluteMs));
      pool
        .query('update session set sess = $1, expire = $2 where sid = $3', [data, expire, sid])
        .then(
          () => {
            done();
          },
          (error: unknown) => {
            done(error);
          },
        );
    }
  };
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
      // Whoever asks goes on as nobody: routes that need somebody say so themselves.
      req.session.regenerate((error: unknown) => {
        next(error);
      });
      return;
    }
    if (at - usedAt > usedAtPrecisionMs) req.session.usedAt = at;
    next();
  };
}
