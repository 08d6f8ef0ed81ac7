import { randomBytes } from 'node:crypto';
import type { RequestHandler, Response } from 'express';
import helmet from 'helmet';

export function styleNonce(res: Response): string {
  return res.locals['nonce'] as string;
}

/**
 * The content security policy and its companions, on every reply. Style elements need this reply's nonce: Angular and
 * the grid add them at run time. Both set styles of elements through the object model, which the policy allows.
 */
export function securityHeaders(isLocal: boolean): RequestHandler[] {
  const nonce: RequestHandler = (_req, res, next) => {
    res.locals['nonce'] = randomBytes(16).toString('base64');
    next();
  };
  const directives: Record<string, Iterable<string | ((req: unknown, res: unknown) => string)>> = {
    'default-src': ["'none'"],
    'script-src': ["'self'"],
    'style-src': ["'self'", (_req, res) => `'nonce-${styleNonce(res as Response)}'`],
    'style-src-attr': ["'none'"],
    'img-src': ["'self'", 'data:', 'blob:'],
    'font-src': ["'self'"],
    'connect-src': ["'self'"],
    'worker-src': ["'self'"],
    'manifest-src': ["'self'"],
    'form-action': ["'self'"],
    'frame-ancestors': ["'none'"],
    'base-uri': ["'none'"],
    'object-src': ["'none'"],
  };
  if (!isLocal) directives['upgrade-insecure-requests'] = [];
  return [
    nonce,
    helmet({
      contentSecurityPolicy: { useDefaults: false, directives },
      strictTransportSecurity: isLocal ? false : { maxAge: 31_536_000, includeSubDomains: true },
      referrerPolicy: { policy: 'no-referrer' },
      crossOriginOpenerPolicy: { policy: 'same-origin' },
    }),
  ];
}
