import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto';
import type { Request, RequestHandler, Response } from 'express';
import { AppError } from '../errors/app-error';

const safeMethods = new Set(['GET', 'HEAD', 'OPTIONS']);

export interface CrossSiteOptions {
  readonly secret: string;
  readonly isLocal: boolean;
  /** Scheme, host and port that browsers see. */
  readonly origin: string;
}

export function xsrfCookieName(isLocal: boolean): string {
  return isLocal ? 'XSRF' : '__Host-XSRF';
}

/**
 * Refuses changes that another site asks for: by the browser's own word on the origin, by a token signed for this
 * session (OWASP's signed double submit), and by taking only bodies that a form of another site cannot send.
 */
export class CrossSiteGuard {
  constructor(private readonly options: CrossSiteOptions) {}

  readonly check: RequestHandler = (req, _res, next) => {
    if (req.get('sec-fetch-dest') === 'document' && !req.originalUrl.startsWith('/api/files/'))
      throw refused('The API is not a page.');
    if (safeMethods.has(req.method)) {
      next();
      return;
    }
    const site = req.get('sec-fetch-site');
    const isSameOrigin =
      site === undefined ? req.get('origin') === this.options.origin : site === 'same-origin';
    if (!isSameOrigin) throw refused('The request came from another site.');
    const type = req.get('content-type');
    if (type !== undefined && !/^(application\/json|multipart\/form-data)\b/i.test(type))
      throw refused('Bodies are taken as JSON or as an upload.');
    if (!this.isValid(req.get('x-xsrf-token') ?? '', req))
      throw refused('The page is out of date. Load it again.');
    next();
  };

  /** Sets the cookie that the page sends back as a header; after signing in or out it must be set anew. */
  issue(req: Request, res: Response): void {
    const random = randomBytes(16).toString('base64url');
    res.cookie(xsrfCookieName(this.options.isLocal), `${random}.${this.sign(random, req)}`, {
      secure: !this.options.isLocal,
      sameSite: 'lax',
      path: '/',
    });
  }

  private isValid(token: string, req: Request): boolean {
    const [random, signature] = token.split('.');
    if (random === undefined || signature === undefined) return false;
    const expected = Buffer.from(this.sign(random, req));
    const found = Buffer.from(signature);
    return expected.length === found.length && timingSafeEqual(expected, found);
  }

  private sign(random: string, req: Request): string {
    const binding = req.session.signedInAt === undefined ? 'nobody' : req.sessionID;
    return createHmac('sha256', this.options.secret)
      .update(`${binding}.${random}`)
      .digest('base64url');
  }
}

function refused(detail: string): AppError {
  return new AppError('cross-site', 403, detail);
}
