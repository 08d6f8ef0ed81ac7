import { once } from 'node:events';
import { existsSync, readFileSync } from 'node:fs';
import { createServer as createHttpServer, type Server } from 'node:http';
import { createServer as createHttpsServer } from 'node:https';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { pino } from 'pino';
import { isDatabaseUnavailable } from '../db/errors';
import { createApp } from './app';
import { compose } from './compose';
import { type Config, ConfigError, readConfig } from './config';

const drainMs = 20_000;
const forceMs = 25_000;

async function main(): Promise<void> {
  const config = readConfig(process.env);
  const logger = pino({ level: config.logLevel });
  const backendFolder = dirname(fileURLToPath(import.meta.url));
  const now = (): Date => new Date();
  const composition = compose({ ...config, now, logger, backendFolder });
  await composition.start();

  let isStopping = false;
  const browserFolder =
    process.env['KINVALE_BROWSER_FOLDER'] ?? join(backendFolder, '..', 'browser');
  const app = createApp({
    ...config,
    services: composition.services,
    sessionPool: composition.sessionPool,
    logger,
    now,
    isStopping: () => isStopping,
    browserFolder: existsSync(join(browserFolder, 'index.html')) ? browserFolder : undefined,
  });
  const server = createServer(config, app);
  server.requestTimeout = 60_000;
  server.headersTimeout = 15_000;
  server.keepAliveTimeout = 65_000;
  server.listen(config.port, config.host);
  await once(server, 'listening');
  const address = server.address();
  const port = typeof address === 'object' && address !== null ? address.port : config.port;
  const scheme = config.tls === undefined ? 'http' : 'https';
  logger.info({ listening: `${scheme}://${config.host}:${port}` }, 'listening');

  const stop = (): void => {
    if (isStopping) process.exit(1);
    isStopping = true;
    setTimeout(() => {
      server.closeAllConnections();
    }, drainMs).unref();
    setTimeout(() => process.exit(1), forceMs).unref();
    server.close(() => {
      composition.stop().then(
        () => process.exit(0),
        (error: unknown) => {
          logger.error({ err: error }, 'stopping failed');
          process.exit(1);
        },
      );
    });
    server.closeIdleConnections();
  };
  process.on('SIGTERM', stop);
  process.on('SIGINT', stop);
  for (const event of ['uncaughtException', 'unhandledRejection'] as const)
    process.on(event, (error: unknown) => {
      // The queue package does not wait for all it writes: a database that is away ends no server.
      if (isDatabaseUnavailable(error)) {
        logger.error({ err: error }, event);
        return;
      }
      logger.fatal({ err: error }, event);
      process.exitCode = 1;
      process.exit(1);
    });
}

function createServer(config: Config, app: ReturnType<typeof createApp>): Server {
  if (config.tls === undefined) return createHttpServer(app);
  return createHttpsServer(
    { cert: readFileSync(config.tls.certPath), key: readFileSync(config.tls.keyPath) },
    app,
  );
}

main().catch((error: unknown) => {
  const lines =
    error instanceof ConfigError || (error instanceof Error && 'code' in error)
      ? error.message
      : error instanceof Error
        ? (error.stack ?? error.message)
        : String(error);
  process.stderr.write(`Kinvale cannot start.\n${lines}\n`);
  process.exit(1);
});
