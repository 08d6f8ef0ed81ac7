import express, { type Express, type NextFunction, type Request, type Response } from 'express';
import { answer, type Clock } from './answer';
import { shortId } from './ids';
import { routes } from './routes';
import { Store } from './store';
import { badRequest, notInStub, StripeFailure } from './stripe-failure';

/** The API version of the SDK that the product is built with. */
export const stripeVersion = '2026-10-28.endive';

export interface StripeStubOptions {
  /** File that keeps the state; without one it lives in memory. */
  readonly statePath?: string;
  /** Unix seconds; the machine's clock unless given. */
  readonly now?: Clock;
}

/** The stub as an HTTP handler: `createServer(createStripeStub())`. */
export function createStripeStub(options: StripeStubOptions = {}): Express {
  const store = new Store(options.statePath);
  const now = options.now ?? (() => Math.floor(Date.now() / 1000));
  const app = express();
  app.disable('x-powered-by').disable('etag').set('query parser', 'extended');
  app.use(gate);
  app.use(express.urlencoded({ extended: true, limit: '1mb' }));
  for (const route of routes) {
    app[route.method](route.path, (request, response) => {
      answer(route, request, response, store, now());
    });
  }
  app.use((request) => {
    throw new StripeFailure(
      404,
      'invalid_request_error',
      `Unrecognized request URL (${request.method}: ${request.path}).`,
    );
  });
  app.use(sendFailure);
  return app;
}

/** Names the request, then asks for a test key, the pinned version and a form. */
function gate(request: Request, response: Response, next: NextFunction): void {
  response.set('Request-Id', shortId('req_'));
  response.set('Stripe-Version', stripeVersion);
  const key = /^Bearer (\S+)$/.exec(request.get('authorization') ?? '')?.[1];
  if (key === undefined) {
    throw new StripeFailure(401, 'invalid_request_error', 'You did not provide an API key.');
  }
  if (!/^sk_test_\w+$/.test(key)) {
    throw new StripeFailure(
      401,
      'invalid_request_error',
      `Invalid API Key provided: ${key.slice(0, 8)}****`,
    );
  }
  const version = request.get('stripe-version');
  if (version !== undefined && version !== stripeVersion) {
    throw notInStub('Stripe-Version', `Stripe-Version ${version}, only ${stripeVersion}`);
  }
  const hasBody = Number(request.get('content-length') ?? 0) > 0;
  if (hasBody && !request.is('application/x-www-form-urlencoded')) {
    throw badRequest(
      'Invalid request (check that your POST content type is application/x-www-form-urlencoded).',
    );
  }
  next();
}

/** Express knows an error handler by its four parameters. */
function sendFailure(error: unknown, _request: Request, response: Response, _next: NextFunction) {
  const failure = asFailure(error);
  if (failure.status === 501) response.set('Stripe-Should-Retry', 'false');
  response.status(failure.status).json(failure);
}

function asFailure(error: unknown): StripeFailure {
  if (error instanceof StripeFailure) return error;
  const status = (error as { status?: unknown } | null)?.status;
  if (typeof status === 'number' && status >= 400 && status < 500) {
    return new StripeFailure(400, 'invalid_request_error', String(error));
  }
  console.error(error);
  return new StripeFailure(500, 'api_error', 'An unknown error occurred.');
}
