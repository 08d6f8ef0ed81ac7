import compression from 'compression';
import express, { type Express, type RequestHandler } from 'express';
import type { Logger } from 'pino';
import {
  isDatabaseFull,
  isDatabaseUnavailable,
  isMissingReference,
  isUnstorableText,
  UniqueViolation,
} from '../db/errors';
import { accountRoutes } from './accounts/account-routes';
import { loadMember } from './accounts/load-member';
import { memberRoutes } from './accounts/member-routes';
import { createAuthenticator } from './accounts/sign-in-strategy';
import { seatRoutes } from './billing/seat-routes';
import { deskRoutes } from './board/desk-routes';
import { editionExportRoutes } from './board/edition-export-routes';
import { editionRoutes } from './board/edition-routes';
import type { Services } from './compose';
import { apiRoutes } from './contract';
import { AppError, Conflict, Invalid, NotFound, Unavailable } from './errors/app-error';
import { evidenceRoutes } from './fits/evidence-routes';
import { fitRoutes } from './fits/fit-routes';
import { replicationRoutes } from './fits/replication/replication-routes';
import { trialRoutes } from './fits/trials/trial-routes';
import { applicationPage } from './http/application-page';
import { CrossSiteGuard } from './http/cross-site';
import { health } from './http/health';
import { largeBody } from './http/large-body';
import { problemHandler } from './http/problem-handler';
import { requestLog } from './http/request-id';
import { securityHeaders } from './http/security-headers';
import { sessions, type SessionPool } from './http/session';
import { correctionRoutes } from './panels/correction-routes';
import { exportRoutes } from './panels/export-routes';
import { importRoutes } from './panels/import-routes';
import { panelRoutes } from './panels/panel-routes';
import { tableRoutes } from './panels/table-routes';
import { peerRoutes } from './peers/peer-routes';
import { scenarioRoutes } from './scenarios/scenario-routes';

export interface AppOptions {
  readonly services: Services;
  readonly logger: Logger;
  readonly sessionSecrets: readonly string[];
  /** The pool of the session store. */
  readonly sessionPool: SessionPool;
  readonly isLocal: boolean;
  readonly publicOrigin: string;
  readonly trustProxyHops: number;
  readonly now: () => Date;
  readonly isStopping: () => boolean;
  /** The built application, where this server serves it. */
  readonly browserFolder: string | undefined;
}

const noStore: RequestHandler = (_req, res, next) => {
  res.setHeader('Cache-Control', 'no-store');
  next();
};

/** The Express application, without listening: a test can hold it. */
export function createApp(options: AppOptions): Express {
  const { services, now, isLocal } = options;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', options.trustProxyHops);
  app.set('query parser', 'simple');

  app.use(requestLog(options.logger));
  app.use(securityHeaders(isLocal));
  app.use(
    health({
      isSchemaCurrent: () => services.repositories.isAtLatestMigration(),
      isStopping: options.isStopping,
      folder: process.cwd(),
    }),
  );
  app.use(compression());

  const crossSite = new CrossSiteGuard({
    secret: options.sessionSecrets[0],
    isLocal,
    origin: options.publicOrigin,
  });
  const authenticator = createAuthenticator(services.accounts);
  app.use(
    '/api',
    noStore,
    sessions({ secrets: options.sessionSecrets, isLocal, pool: options.sessionPool, now }),
  );
  app.use('/api', authenticator.session() as RequestHandler, loadMember(services.repositories));
  app.use('/api', crossSite.check);
  app.use(largeBody(apiRoutes.saveCorrections, '16mb'));
  app.use(largeBody(apiRoutes.makeTableFile, '8mb'));
  app.use(express.json({ limit: '2mb' }));
  app.use(
    accountRoutes({
      accounts: services.accounts,
      members: services.members,
      authenticator,
      crossSite,
      now,
    }),
  );
  app.use(memberRoutes(services.members, now));
  app.use(importRoutes(services.imports, services.commits, services.samplePanel));
  app.use(panelRoutes(services.panels));
  app.use(correctionRoutes(services));
  app.use(exportRoutes(services.exports));
  app.use(tableRoutes(now));
  app.use(peerRoutes(services.peers));
  app.use(fitRoutes(services.fits, services.lineage, now));
  app.use(evidenceRoutes(services.evidence, services.bootstraps, now));
  app.use(replicationRoutes(services.replication));
  app.use(trialRoutes(services.trials, now));
  app.use(scenarioRoutes(services.scenarios));
  app.use(deskRoutes(services.desk));
  app.use(editionRoutes(services.editions, services.editionDesk, services.lineage));
  app.use(editionExportRoutes(services.editions, services.editionDesk, now));
  app.use(seatRoutes(services.billing));

  if (options.browserFolder !== undefined) app.use(applicationPage(options.browserFolder, isLocal));
  app.use(() => {
    throw new NotFound();
  });
  app.use(problemHandler(fromDatabase));
  return app;
}

function fromDatabase(error: unknown): AppError | undefined {
  if (isDatabaseFull(error))
    return new AppError('storage-full', 507, 'The server has no space left to store this.');
  if (isUnstorableText(error))
    return new Invalid('A text has a character that cannot be stored. Take it out and try again.');
  if (error instanceof UniqueViolation || isMissingReference(error))
    return new Conflict('Something changed meanwhile. Load the page again and try once more.');
  if (isDatabaseUnavailable(error))
    return new Unavailable('The database is busy or being restarted. Try again in a moment.');
  return undefined;
}
