import { existsSync } from 'node:fs';
import { join } from 'node:path';
import type { Logger } from 'pino';
import { createDatabase, createPool } from '../db/connect';
import { Repositories } from '../db/repositories/repositories';
import { AccountService } from './accounts/account-service';
import { MemberService } from './accounts/member-service';
import { Passwords } from './accounts/passwords';
import { SignInThrottle } from './accounts/sign-in-throttle';
import { BillingService } from './billing/billing-service';
import { workOpenBillingAccount } from './billing/open-account-job';
import { StripeGateway } from './billing/stripe-gateway';
import { DeskService } from './board/desk-service';
import { editionWriter } from './board/content/edition-content';
import { EditionDeskService } from './board/edition-desk-service';
import { EditionMails } from './board/edition-mails';
import { EditionService } from './board/edition-service';
import { FitPool } from './compute/fit-pool';
import { ParseProcess } from './compute/parse-process';
import { BootstrapJob } from './fits/bootstrap-job';
import { BootstrapService } from './fits/bootstrap-service';
import { EvidenceJob } from './fits/evidence-job';
import { EvidenceService } from './fits/evidence-service';
import { FitJob } from './fits/fit-job';
import { FitService } from './fits/fit-service';
import { LineageService } from './fits/lineage-service';
import { ReplicationService } from './fits/replication/replication-service';
import { TrialJob } from './fits/trials/trial-job';
import { TrialService } from './fits/trials/trial-service';
import type { SessionPool } from './http/session';
import { JobQueue } from './jobs/job-queue';
import { MailJob } from './mail/mail-job';
import { MailRound } from './mail/mail-round';
import { Outbox } from './mail/outbox';
import { SmtpSender, type SmtpSettings } from './mail/smtp-sender';
import { CorrectionService } from './panels/correction-service';
import { FlagDismissalService } from './panels/flag-dismissal-service';
import { ImportCommitService } from './panels/import-commit-service';
import { ImportJob } from './panels/import-job';
import { ImportService } from './panels/import-service';
import { PanelExportService } from './panels/panel-export-service';
import { PanelHistoryService } from './panels/panel-history-service';
import { PanelService } from './panels/panel-service';
import { readSamplePanel, type SamplePanel } from './panels/sample-panel';
import { PeerService } from './peers/peer-service';
import { queueSql } from './queue-sql';
import { ScenarioService } from './scenarios/scenario-service';

export interface ComposeOptions {
  readonly databaseUrl: string;
  readonly stripe: { readonly secretKey: string; readonly apiUrl: string | undefined };
  /** Undefined where no mail is sent: it waits in the outbox. */
  readonly mail: SmtpSettings | undefined;
  /** Scheme, host and port that browsers see, for links in mails. */
  readonly publicOrigin: string;
  readonly fitThreads: number;
  readonly now: () => Date;
  readonly logger: Logger;
  /** Where this file's built or source neighbours lie: workers and the sample panel are found from it. */
  readonly backendFolder: string;
}

export interface Services {
  readonly repositories: Repositories;
  readonly accounts: AccountService;
  readonly members: MemberService;
  readonly imports: ImportService;
  readonly commits: ImportCommitService;
  readonly panels: PanelService;
  readonly corrections: CorrectionService;
  readonly history: PanelHistoryService;
  readonly dismissals: FlagDismissalService;
  readonly exports: PanelExportService;
  readonly samplePanel: SamplePanel;
  readonly peers: PeerService;
  readonly fits: FitService;
  readonly lineage: LineageService;
  readonly evidence: EvidenceService;
  readonly bootstraps: BootstrapService;
  readonly replication: ReplicationService;
  readonly trials: TrialService;
  readonly scenarios: ScenarioService;
  readonly desk: DeskService;
  readonly editions: EditionService;
  readonly editionDesk: EditionDeskService;
  readonly billing: BillingService;
}

export interface Composition {
  readonly services: Services;
  /** The session store's own small pool. */
  readonly sessionPool: SessionPool;
  /** Checks the database role and starts working the queues. */
  start(): Promise<void>;
  /** Stops taking jobs, waits for those under way, closes workers and pools, in this order. */
  stop(): Promise<void>;
}

/** The composition root: the only place that constructs pools, repositories and services. */
export function compose(options: ComposeOptions): Composition {
  const { logger, now } = options;
  const onConnectionError = (error: Error): void => {
    logger.warn({ err: error }, 'database connection lost');
  };
  const pool = (applicationName: string, max: number, statementTimeoutMs: number) =>
    createPool({
      connectionString: options.databaseUrl,
      max,
      applicationName,
      statementTimeoutMs,
      onConnectionError,
      onWarning: (message) => {
        logger.error({ warning: message }, 'database warning');
      },
    });
  const webPool = pool('kinvale-web', 10, 15_000);
  const sessionPool = pool('kinvale-session', 4, 15_000);
  const queuePool = pool('kinvale-queue', 3, 120_000);
  const workPool = pool('kinvale-work', 5, 120_000);

  const repositories = new Repositories(createDatabase(webPool));
  const workRepositories = new Repositories(createDatabase(workPool));
  const queue = new JobQueue({
    repositories: workRepositories,
    executeSql: queueSql(queuePool),
    onError: (error) => {
      logger.error({ err: error }, 'job queue');
    },
  });
  const entry = (source: string, built: string): string => {
    const sourceFile = join(options.backendFolder, source);
    return existsSync(sourceFile) ? sourceFile : join(options.backendFolder, built);
  };
  const fitPool = new FitPool(entry('compute/fit-worker.ts', 'fit-worker.js'), options.fitThreads);
  const parser = new ParseProcess(entry('compute/parse-child.ts', 'parse-child.js'), {
    onStderr: (line) => {
      logger.warn({ line }, 'file reader');
    },
  });
  const passwords = new Passwords();
  const throttle = new SignInThrottle(repositories, now);
  const accounts = new AccountService({ repositories, passwords, throttle, queue });
  const gateway = new StripeGateway(options.stripe);
  const billing = new BillingService({ repositories, gateway, queue, now });
  const sender = options.mail === undefined ? undefined : new SmtpSender(options.mail);
  const mailRound = new MailRound(workRepositories, queue, (error) => {
    logger.error({ err: error }, 'mail');
  });
  const startMail = async (): Promise<void> => {
    if (sender === undefined) {
      logger.info('mail is off: what is to be sent waits');
      return;
    }
    const mailJob = new MailJob({
      repositories: workRepositories,
      sender,
      publicOrigin: options.publicOrigin,
      onRefused: (mailId, words) => {
        logger.warn({ mailId, words }, 'mail refused');
      },
    });
    await queue.work('mail', (ticket) => mailJob.run(ticket));
    mailRound.start();
  };

  return {
    sessionPool,
    services: {
      repositories,
      accounts,
      members: new MemberService({ repositories, passwords, accounts, now }),
      imports: new ImportService(repositories, parser),
      commits: new ImportCommitService(repositories, queue),
      panels: new PanelService(repositories),
      corrections: new CorrectionService(repositories),
      history: new PanelHistoryService(repositories),
      dismissals: new FlagDismissalService(repositories),
      exports: new PanelExportService(repositories),
      samplePanel: readSamplePanel(options.backendFolder),
      peers: new PeerService(repositories),
      fits: new FitService(repositories, queue),
      lineage: new LineageService(repositories),
      evidence: new EvidenceService(repositories),
      bootstraps: new BootstrapService(repositories, queue),
      replication: new ReplicationService(
        repositories,
        join(options.backendFolder, 'fits', 'replication', 'replication.R'),
      ),
      trials: new TrialService(repositories, queue),
      scenarios: new ScenarioService(repositories, now),
      desk: new DeskService(repositories),
      editions: new EditionService(
        repositories,
        accounts,
        now,
        editionWriter,
        new EditionMails(new Outbox(queue)),
      ),
      editionDesk: new EditionDeskService(repositories, now, editionWriter),
      billing,
    },
    start: async () => {
      await repositories.assertUnprivilegedRole();
      await throttle.prune();
      await queue.start();
      const fitJob = new FitJob(workRepositories, queue, fitPool, now);
      for (let worker = 0; worker < options.fitThreads; worker++)
        await queue.work(
          'fit',
          (ticket) => fitJob.run(ticket),
          (ticket) => fitJob.giveUp(ticket),
        );
      const evidenceJob = new EvidenceJob(workRepositories, fitPool);
      await queue.work(
        'evidence',
        (ticket) => evidenceJob.run(ticket),
        (ticket) => evidenceJob.giveUp(ticket),
      );
      const bootstrapJob = new BootstrapJob(workRepositories, fitPool, now);
      await queue.work(
        'bootstrap',
        (ticket) => bootstrapJob.run(ticket),
        (ticket) => bootstrapJob.giveUp(ticket),
      );
      const trialJob = new TrialJob(workRepositories, fitPool, now);
      await queue.work(
        'peer-trial',
        (ticket) => trialJob.run(ticket),
        (ticket) => trialJob.giveUp(ticket),
      );
      const importJob = new ImportJob(workRepositories, parser);
      await queue.work(
        'import',
        (ticket) => importJob.run(ticket),
        (ticket) => importJob.giveUp(ticket),
      );
      await queue.work('open-billing-account', workOpenBillingAccount(billing));
      await startMail();
    },
    stop: async () => {
      await mailRound.stop();
      await queue.stop(() => {
        sender?.close();
        return fitPool.close();
      });
      await Promise.all([webPool, sessionPool, queuePool, workPool].map((each) => each.end()));
    },
  };
}
