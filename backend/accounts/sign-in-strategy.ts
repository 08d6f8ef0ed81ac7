import type { Request, RequestHandler } from 'express';
import passport from 'passport';
import { Strategy } from 'passport-local';
import { SignIn } from '../contract';
import { NotSignedIn } from '../errors/app-error';
import { parse } from '../http/parse';
import type { AccountService } from './account-service';

declare global {
  // Passport's own declaration is extended through this namespace.
  // eslint-disable-next-line @typescript-eslint/no-namespace
  namespace Express {
    interface User {
      readonly personId: string;
      readonly workspaceId: string;
    }
  }
}

/** Passport with our one way to sign in; the session keeps the person's id and nothing else of theirs. */
export function createAuthenticator(accounts: AccountService): passport.PassportStatic {
  const authenticator = new passport.Passport() as unknown as passport.PassportStatic;
  authenticator.use(
    new Strategy(
      { usernameField: 'email', passwordField: 'password', passReqToCallback: true },
      (req, _email, _password, done) => {
        const request = parse(SignIn, req.body);
        accounts.signIn(request.email, request.password, req.ip ?? '').then(
          (user) => {
            done(null, user);
          },
          (error: unknown) => {
            done(error);
          },
        );
      },
    ),
  );
  authenticator.serializeUser((user, done) => {
    done(null, user.personId);
  });
  authenticator.deserializeUser((req: Request, personId: string, done: Done) => {
    done(null, { personId, workspaceId: req.session.workspaceId ?? '' });
  });
  return authenticator;
}

type Done = (error: unknown, user?: Express.User) => void;

/** Starts a session under a new id. */
export async function startSession(req: Request, user: Express.User, now: Date): Promise<void> {
  await new Promise<void>((resolve, reject) => {
    req.login(user, (error: unknown) => {
      if (error instanceof Error) reject(error);
      else resolve();
    });
  });
  req.session.workspaceId = user.workspaceId;
  req.session.signedInAt = now.getTime();
  req.session.usedAt = now.getTime();
  await new Promise<void>((resolve, reject) => {
    req.session.save((error: unknown) => {
      if (error instanceof Error) reject(error);
      else resolve();
    });
  });
}

/** Ends the session and destroys its row. */
export async function endSession(req: Request): Promise<void> {
  await new Promise<void>((resolve, reject) => {
    req.session.destroy((error: unknown) => {
      if (error instanceof Error) reject(error);
      else resolve();
    });
  });
}

/** Runs the strategy and hands its user on, or its refusal to the problem handler. */
export function authenticate(authenticator: passport.PassportStatic): RequestHandler {
  return (req, res, next) => {
    parse(SignIn, req.body);
    const run = authenticator.authenticate(
      'local',
      { session: false },
      (error: unknown, user: Express.User | false | undefined) => {
        if (error !== null && error !== undefined) {
          next(error);
        } else if (!user) {
          next(new NotSignedIn());
        } else {
          req.user = user;
          next();
        }
      },
    ) as RequestHandler;
    void run(req, res, next);
  };
}
