import { CompiledQuery, type Kysely, sql } from 'kysely';
import type { Database } from '../schema/database';
import { latestMigration } from '../migrations/migrations';
import { ActivityRepository } from './activity-repository';
import { BillingRepository } from './billing-repository';
import { BootstrapsRepository } from './bootstraps-repository';
import { EditionDeskRepository } from './edition-desk-repository';
import { EditionsRepository } from './editions-repository';
import { EvidenceRepository } from './evidence-repository';
import { FilesRepository } from './files-repository';
import { FitsRepository } from './fits-repository';
import { FlagDismissalsRepository } from './flag-dismissals-repository';
import { ImportsRepository } from './imports-repository';
import { JobTicketsRepository } from './jobs-repository';
import { MailDueRepository, MailRepository } from './mail-repository';
import { MembersRepository } from './members-repository';
import { PanelCopiesRepository } from './panel-copies-repository';
import { PanelCorrectionsRepository } from './panel-corrections-repository';
import { PanelDifferencesRepository } from './panel-differences-repository';
import { PanelRowsRepository } from './panel-rows-repository';
import { PanelsRepository } from './panels-repository';
import { PeerTrialsRepository } from './peer-trials-repository';
import { PeersRepository } from './peers-repository';
import { PeopleRepository, SignInThrottleRepository } from './people-repository';
import { ScenariosRepository } from './scenarios-repository';

/** Everything of one workspace, within one transaction that row level security holds to it. */
export interface WorkspaceRepositories {
  readonly workspaceId: string;
  readonly people: PeopleRepository;
  readonly members: MembersRepository;
  readonly activity: ActivityRepository;
  readonly files: FilesRepository;
  readonly imports: ImportsRepository;
  readonly panels: PanelsRepository;
  readonly panelRows: PanelRowsRepository;
  readonly panelCopies: PanelCopiesRepository;
  readonly panelDifferences: PanelDifferencesRepository;
  readonly panelCorrections: PanelCorrectionsRepository;
  readonly flagDismissals: FlagDismissalsRepository;
  readonly peers: PeersRepository;
  readonly peerTrials: PeerTrialsRepository;
  readonly fits: FitsRepository;
  readonly evidence: EvidenceRepository;
  readonly bootstraps: BootstrapsRepository;
  readonly scenarios: ScenariosRepository;
  readonly editions: EditionsRepository;
  readonly editionDesk: EditionDeskRepository;
  readonly billing: BillingRepository;
  readonly mail: MailRepository;
  readonly jobTickets: JobTicketsRepository;
  /** Lets the queue package write within this transaction. */
  executeSql(text: string, values: unknown[]): Promise<{ rows: unknown[] }>;
}

export interface Membership {
  readonly workspaceId: string;
  readonly workspaceName: string;
  readonly roles: readonly string[];
}

/** The only way to the database: data of a workspace is reached through `inWorkspace` alone. */
export class Repositories {
  readonly people: PeopleRepository;
  readonly signInThrottle: SignInThrottleRepository;
  readonly jobTickets: JobTicketsRepository;
  readonly mailDue: MailDueRepository;

  constructor(private readonly db: Kysely<Database>) {
    this.people = new PeopleRepository(db);
    this.signInThrottle = new SignInThrottleRepository(db);
    this.jobTickets = new JobTicketsRepository(db);
    this.mailDue = new MailDueRepository(db);
  }

  /** One transaction, with the workspace set for it alone; await nothing from outside the database in it. */
  inWorkspace<T>(workspaceId: string, work: (tx: WorkspaceRepositories) => Promise<T>): Promise<T> {
    return this.db.transaction().execute(async (trx) => {
      await sql`select set_config('app.workspace', ${workspaceId}, true)`.execute(trx);
      return work({
        workspaceId,
        people: new PeopleRepository(trx),
        members: new MembersRepository(trx, workspaceId),
        activity: new ActivityRepository(trx, workspaceId),
        files: new FilesRepository(trx, workspaceId),
        imports: new ImportsRepository(trx, workspaceId),
        panels: new PanelsRepository(trx, workspaceId),
        panelRows: new PanelRowsRepository(trx, workspaceId),
        panelCopies: new PanelCopiesRepository(trx, workspaceId),
        panelDifferences: new PanelDifferencesRepository(trx, workspaceId),
        panelCorrections: new PanelCorrectionsRepository(trx, workspaceId),
        flagDismissals: new FlagDismissalsRepository(trx, workspaceId),
        peers: new PeersRepository(trx, workspaceId),
        peerTrials: new PeerTrialsRepository(trx, workspaceId),
        fits: new FitsRepository(trx, workspaceId),
        evidence: new EvidenceRepository(trx, workspaceId),
        bootstraps: new BootstrapsRepository(trx, workspaceId),
        scenarios: new ScenariosRepository(trx, workspaceId),
        editions: new EditionsRepository(trx, workspaceId),
        editionDesk: new EditionDeskRepository(trx, workspaceId),
        billing: new BillingRepository(trx, workspaceId),
        mail: new MailRepository(trx, workspaceId),
        jobTickets: new JobTicketsRepository(trx),
        executeSql: async (text, values) => {
          const result = await trx.executeQuery(CompiledQuery.raw(text, values));
          return { rows: result.rows };
        },
      });
    });
  }

  /** The workspaces that a person belongs to, newest membership first. */
  async membershipsOf(personId: string): Promise<readonly Membership[]> {
    const found = await this.db.transaction().execute(async (trx) => {
      await sql`select set_config('app.person', ${personId}, true)`.execute(trx);
      return trx
        .selectFrom('membership')
        .select(['workspaceId', 'roles'])
        .where('personId', '=', personId)
        .orderBy('joinedAt', 'desc')
        .execute();
    });
    return Promise.all(
      found.map(async ({ workspaceId, roles }) => {
        const workspace = await this.inWorkspace(workspaceId, (tx) => tx.members.workspace());
        return { workspaceId, roles, workspaceName: workspace?.name ?? '' };
      }),
    );
  }

  /** Ends every session of a person, at once and on every server. */
  async endSessions(personId: string): Promise<void> {
    await sql`delete from session where sess #>> '{passport,user}' = ${personId}`.execute(this.db);
  }

  /** @throws when the database does not answer; false when its schema is not the one this build expects. */
  async isAtLatestMigration(): Promise<boolean> {
    const found = await sql<{ name: string }>`
      select name from kysely_migration order by name desc limit 1`.execute(this.db);
    return found.rows[0]?.name === latestMigration;
  }

  /**
   * The role must own nothing and must not be able to step over row level security.
   * @throws with what is wrong.
   */
  async assertUnprivilegedRole(): Promise<void> {
    const found = await sql<{ bypasses: boolean; owns: boolean }>`
      select rolsuper or rolbypassrls as bypasses,
        exists (select from pg_class where relowner = pg_roles.oid) as owns
      from pg_roles where rolname = current_user`.execute(this.db);
    const role = found.rows[0];
    if (role === undefined || role.bypasses)
      throw new Error(
        'DATABASE_URL signs in with a role that steps over row level security; name one that is neither superuser nor BYPASSRLS',
      );
    if (role.owns)
      throw new Error(
        'DATABASE_URL signs in with a role that owns tables; name the application role, which owns nothing',
      );
  }
}
