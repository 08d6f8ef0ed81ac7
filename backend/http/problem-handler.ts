import type { ErrorRequestHandler, Response } from 'express';
import { problemType, type ProblemSlug } from '../contract';
import { AppError, TooManyRequests, Unavailable } from '../errors/app-error';
import { requestId } from './request-id';

const titles: Readonly<Record<ProblemSlug, string>> = {
  'bad-request': 'The request is not as expected',
  'not-signed-in': 'Not signed in',
  'wrong-credentials': 'E-mail address or password is wrong',
  forbidden: 'Not allowed',
  'cross-site': 'The request did not come from this site',
  'not-found': 'Not found',
  conflict: 'Something changed meanwhile',
  gone: 'No longer valid',
  'too-large': 'Too large',
  'type-not-allowed': 'This kind of file is not taken',
  'unreadable-file': 'The file cannot be read',
  'too-many-requests': 'Too many requests',
  quota: 'As much as the workspace may have',
  unavailable: 'Not available just now',
  internal: 'Something went wrong on our side',
  'warnings-unopened': 'Warnings not opened',
  'headline-mismatch': 'Headline and figures part',
  'four-eyes': 'Four eyes: another person has to sign',
  'import-not-ready': 'The import is not ready',
  'stale-version': 'A newer version exists',
  'billing-unavailable': 'Billing cannot be reached just now',
  'storage-full': 'No space left',
};

/** Our error for one of a layer below, or undefined when the layer does not know it. */
export type ErrorTranslator = (error: unknown) => AppError | undefined;

/** The one place that answers errors, as `application/problem+json` (RFC 9457). */
export function problemHandler(translate: ErrorTranslator): ErrorRequestHandler {
  return (error: unknown, req, res, next) => {
    if (res.headersSent) {
      next(error);
      return;
    }
    const known = error instanceof AppError ? error : (fromExpress(error) ?? translate(error));
    if (known === undefined) {
      req.log.error({ err: error }, 'unexpected error');
      send(res, requestId(req), 'internal', 500, {});
      return;
    }
    if (known.status >= 500) req.log.error({ err: known }, 'request failed');
    if (known instanceof TooManyRequests || known instanceof Unavailable)
      res.setHeader('Retry-After', String(known.retryAfterSeconds));
    send(res, requestId(req), known.slug, known.status, {
      detail: known.detail,
      ...known.members,
    });
  };
}

function send(
  res: Response,
  instance: string,
  slug: ProblemSlug,
  status: number,
  members: Readonly<Record<string, unknown>>,
): void {
  res
    .status(status)
    .type('application/problem+json')
    .send(
      JSON.stringify({
        type: problemType(slug),
        title: titles[slug],
        status,
        instance,
        ...members,
      }),
    );
}

/** Errors of Express's own body parsers carry a status and a type. */
function fromExpress(error: unknown): AppError | undefined {
  if (!(error instanceof Error) || !('status' in error) || typeof error.status !== 'number')
    return undefined;
  if (error.status === 413)
    return new AppError('too-large', 413, 'The request is larger than is taken here.');
  if (error.status >= 400 && error.status < 500)
    return new AppError('bad-request', 400, 'The request cannot be read.');
  return undefined;
}
