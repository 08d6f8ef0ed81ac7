import { randomBytes, randomUUID } from 'node:crypto';
import { createDatabase, createPool } from '../../../db/connect';
import { Repositories } from '../../../db/repositories/repositories';
import { createTestDatabase } from '../../../db/testing/test-database';
import { startStub, type RunningStub } from '../../../stubs/stripe/testing/running-stub';
import { installQueue, queueSchema } from '../../jobs/install-queue';
import { JobQueue } from '../../jobs/job-queue';
import { BillingService } from '../billing-service';
import { StripeGateway } from '../stripe-gateway';

/** Billing on a cloned database, with the stub of Stripe and a queue that nobody works yet. */
export interface BillingBench {
  readonly repositories: Repositories;
  readonly queue: JobQueue;
  readonly stub: RunningStub;
  /** Unix milliseconds, for the service and the stub alike. */
  nowMs: number;
  gateway(): StripeGateway;
  /** Another server process, as far as billing goes. */
  service(): BillingService;
  newWorkspace(): Promise<string>;
  addMember(workspaceId: string, roles: readonly string[]): Promise<string>;
  invite(workspaceId: string, roles: readonly string[], expiresAt: Date): Promise<void>;
  close(): Promise<void>;
}

export async function startBillingBench(): Promise<BillingBench> {
  const database = await createTestDatabase({ schema: queueSchema, install: installQueue });
  const pool = createPool({
    connectionString: database.appUrl,
    max: 4,
    applicationName: 'billing-spec',
    statementTimeoutMs: 5_000,
    onConnectionError: fail,
    onWarning: fail,
  });
  const repositories = new Repositories(createDatabase(pool));
  const queue = new JobQueue({
    repositories,
    executeSql: (text, values) => pool.query(text, values),
    onError: fail,
  });
  await queue.start();
  const bench: BillingBench = {
    repositories,
    queue,
    nowMs: Date.UTC(2026, 2, 4, 8),
    stub: await startStub({ now: () => Math.floor(bench.nowMs / 1000) }),
    gateway: () => new StripeGateway({ secretKey: 'sk_test_spec', apiUrl: bench.stub.url }),
    service: () =>
      new BillingService({
        repositories,
        gateway: bench.gateway(),
        queue,
        now: () => new Date(bench.nowMs),
      }),
    newWorkspace: async () => {
      const workspaceId = randomUUID();
      await repositories.inWorkspace(workspaceId, (tx) =>
        tx.members.insertWorkspace('Velmara finance'),
      );
      return workspaceId;
    },
    addMember: (workspaceId, roles) => addMember(repositories, workspaceId, roles),
    invite: async (workspaceId, roles, expiresAt) => {
      const createdBy = await addMember(repositories, workspaceId, ['billing_admin']);
      await repositories.inWorkspace(workspaceId, (tx) =>
        tx.members.insertInvitation({
          id: randomUUID(),
          tokenHash: randomBytes(32),
          email: `${randomUUID()}@velmara.example`,
          roles,
          createdBy,
          createdAt: new Date(bench.nowMs),
          expiresAt,
        }),
      );
    },
    close: async () => {
      await queue.stop();
      await bench.stub.stop();
      await pool.end();
      await database.drop();
    },
  };
  return bench;
}

async function addMember(
  repositories: Repositories,
  workspaceId: string,
  roles: readonly string[],
): Promise<string> {
  const id = randomUUID();
  await repositories.people.insert({
    id,
    email: `${id}@velmara.example`,
    name: 'Ilvo Brenn',
    passwordHash: 'none',
    preferences: {},
  });
  await repositories.inWorkspace(workspaceId, (tx) => tx.members.add(id, roles));
  return id;
}
