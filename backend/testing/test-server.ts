import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { Express } from 'express';
import { pino } from 'pino';
import { createTestDatabase, type TestDatabase } from '../../db/testing/test-database';
import { createApp } from '../app';
import { compose, type Composition } from '../compose';
import { installQueue, queueSchema } from '../jobs/install-queue';
import type { SmtpSettings } from '../mail/smtp-sender';
import { builtProcesses } from './built-processes';

/** A clock that a spec moves. */
export class TestClock {
  #offsetMs = 0;
  #stoppedAtMs: number | undefined;
  readonly now = (): Date => new Date((this.#stoppedAtMs ?? Date.now()) + this.#offsetMs);

  /** From now on only `advance` moves it, however long the machine takes. */
  stop(): void {
    this.#stoppedAtMs ??= Date.now();
  }

  advance(ms: number): void {
    this.#offsetMs += ms;
  }
}

/** A server process's worth of Kinvale, within the spec's own process. */
export interface TestServer {
  readonly app: Express;
  readonly url: string;
  readonly clock: TestClock;
  readonly composition: Composition;
  /** What it logged, one JSON line each. */
  readonly log: readonly string[];
  close(): Promise<void>;
}

/** What links in mails start with. */
export const testOrigin = 'https://kinvale.example';

export interface TestServerOptions {
  /** The payment provider's address; by default one where nobody answers. */
  readonly stripeUrl?: string;
  /** Where mail is sent; without it mail waits in the outbox. */
  readonly mail?: SmtpSettings;
  /** Plain http as `npm start` serves it; otherwise the cookies of production, for a spec that sends them itself. */
  readonly isLocal?: boolean;
  /** Proxies in front; with one, `X-Forwarded-Proto: https` stands for TLS. */
  readonly trustProxyHops?: number;
}

export function createMigratedDatabase(): Promise<TestDatabase> {
  return createTestDatabase({ schema: queueSchema, install: installQueue });
}

/** Starts Kinvale on a free port of the loopback address, on a database that the caller owns. */
export async function startTestServer(
  database: TestDatabase,
  options: TestServerOptions = {},
): Promise<TestServer> {
  const clock = new TestClock();
  const log: string[] = [];
  const logger = pino({ level: 'info' }, { write: (line: string) => log.push(line) });
  const composition = compose({
    databaseUrl: database.appUrl,
    stripe: { secretKey: 'sk_test_spec', apiUrl: options.stripeUrl ?? 'http://127.0.0.1:9' },
    mail: options.mail,
    publicOrigin: testOrigin,
    fitThreads: 1,
    now: clock.now,
    logger,
    backendFolder: await builtProcesses(),
  });
  await composition.start();
  const server = createServer();
  await new Promise<void>((resolve) =>
    // Exclusive: spec processes that run at once would share one port.
    server.listen({ port: 0, host: '127.0.0.1', exclusive: true }, resolve),
  );
  const url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  const app = createApp({
    services: composition.services,
    sessionPool: composition.sessionPool,
    logger,
    sessionSecrets: ['a secret that only specs know, 32 characters'],
    isLocal: options.isLocal ?? true,
    publicOrigin: url,
    trustProxyHops: options.trustProxyHops ?? 0,
    now: clock.now,
    isStopping: () => false,
    browserFolder: undefined,
  });
  server.on('request', app);
  return { app, url, clock, composition, log, close: () => closeAll(server, composition) };
}

async function closeAll(server: Server, composition: Composition): Promise<void> {
  server.closeAllConnections();
  await new Promise<void>((resolve) => {
    server.close(() => {
      resolve();
    });
  });
  await composition.stop();
}
