import { randomUUID } from 'node:crypto';
import type { IncomingMessage } from 'node:http';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** The id under which a request stands in the log and in its problem reply. */
export function requestId(req: { readonly id?: unknown }): string {
  return typeof req.id === 'string' ? req.id : '';
}

/** One log line a request, without query strings, headers or bodies. */
export function requestLog(logger: Logger) {
  return pinoHttp({
    logger,
    genReqId: () => randomUUID(),
    autoLogging: { ignore: (req) => req.url === '/livez' || req.url === '/readyz' },
    customLogLevel: (_req, res, error) =>
      error !== undefined || res.statusCode >= 500 ? 'error' : 'info',
    serializers: {
      req: (req: IncomingMessage & { readonly id?: unknown }) => ({
        id: req.id,
        method: req.method,
        path: req.url?.split('?')[0],
      }),
      res: (res: { readonly statusCode: number }) => ({ status: res.statusCode }),
    },
  });
}
