import type { ProblemSlug } from '../contract';

export interface FieldError {
  /** JSON pointer into the request body. */
  readonly pointer: string;
  readonly detail: string;
}

/** An error that says to the caller what was wanted, what was found and what to do. */
export class AppError extends Error {
  override readonly name: string = 'AppError';

  constructor(
    readonly slug: ProblemSlug,
    readonly status: number,
    readonly detail: string,
    /** Further members of the problem reply. */
    readonly members: Readonly<Record<string, unknown>> = {},
    options?: ErrorOptions,
  ) {
    super(detail, options);
  }
}

export class Invalid extends AppError {
  override readonly name = 'Invalid';
  constructor(detail: string, errors: readonly FieldError[] = []) {
    super('bad-request', 400, detail, errors.length === 0 ? {} : { errors });
  }
}

export class NotSignedIn extends AppError {
  override readonly name = 'NotSignedIn';
  constructor(detail = 'Sign in first.') {
    super('not-signed-in', 401, detail);
  }
}

export class Forbidden extends AppError {
  override readonly name = 'Forbidden';
  constructor(
    detail = 'Your roles in this workspace do not include this.',
    slug: ProblemSlug = 'forbidden',
  ) {
    super(slug, 403, detail);
  }
}

export class NotFound extends AppError {
  override readonly name = 'NotFound';
  constructor(detail = 'There is nothing here under this address.') {
    super('not-found', 404, detail);
  }
}

export class Conflict extends AppError {
  override readonly name = 'Conflict';
  constructor(
    detail: string,
    slug: ProblemSlug = 'conflict',
    members: Readonly<Record<string, unknown>> = {},
  ) {
    super(slug, 409, detail, members);
  }
}

export class Unprocessable extends AppError {
  override readonly name = 'Unprocessable';
  constructor(detail: string, slug: ProblemSlug, members: Readonly<Record<string, unknown>> = {}) {
    super(slug, 422, detail, members);
  }
}

export class TooManyRequests extends AppError {
  override readonly name = 'TooManyRequests';
  constructor(
    detail: string,
    readonly retryAfterSeconds: number,
    slug: ProblemSlug = 'too-many-requests',
  ) {
    super(slug, 429, detail);
  }
}

export class Unavailable extends AppError {
  override readonly name = 'Unavailable';
  constructor(
    detail: string,
    slug: ProblemSlug = 'unavailable',
    readonly retryAfterSeconds = 2,
    options?: ErrorOptions,
  ) {
    super(slug, 503, detail, {}, options);
  }
}
