import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import express, { type RequestHandler, type Router } from 'express';
import { xsrfCookieName } from './cross-site';
import { styleNonce } from './security-headers';

/** Serves the built application: hashed files for ever, the page itself anew each time with its own nonce. */
export function applicationPage(folder: string, isLocal: boolean): Router {
  const router = express.Router();
  const template = readFileSync(join(folder, 'index.html'), 'utf8');
  const page: RequestHandler = (_req, res) => {
    res
      .type('html')
      .setHeader('Cache-Control', 'no-store')
      .send(
        template
          .replaceAll('{{nonce}}', styleNonce(res))
          .replaceAll('{{xsrfCookie}}', xsrfCookieName(isLocal)),
      );
  };
  router.get(['/', '/index.html'], page);
  router.use(
    express.static(folder, {
      index: false,
      redirect: false,
      setHeaders: (res, path) => {
        const isHashed = /-[A-Z0-9]{8}\.\w+$/.test(path);
        res.setHeader(
          'Cache-Control',
          isHashed ? 'public, max-age=31536000, immutable' : 'no-cache',
        );
      },
    }),
  );
  router.get('/{*path}', (req, res, next) => {
    if (req.path.startsWith('/api/') || /\.\w+$/.test(req.path)) next();
    else void page(req, res, next);
  });
  return router;
}
