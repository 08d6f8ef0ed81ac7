import { type Kysely, sql } from 'kysely';
import type { Database } from '../schema/database';

export interface PeerGroupRow {
  readonly id: string;
  readonly number: number;
  readonly parentId: string | null;
  readonly panelVersionId: string;
  readonly ownCompany: string;
  readonly note: string;
  readonly peerCount: number;
  readonly createdAt: Date;
  readonly createdByName: string;
}

export interface PeerChoiceRow {
  readonly company: string;
  readonly isIncluded: boolean;
  readonly reason: string;
}

export class PeersRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  async insert(
    group: {
      readonly id: string;
      readonly number: number;
      readonly parentId: string | null;
      readonly panelVersionId: string;
      readonly ownCompany: string;
      readonly note: string;
      readonly peerCount: number;
      readonly createdBy: string;
    },
    choices: readonly PeerChoiceRow[],
  ): Promise<void> {
    await this.db
      .insertInto('peerGroupVersion')
      .values({ ...group, workspaceId: this.workspaceId })
      .execute();
    await sql`insert into peer_choice
        (workspace_id, peer_group_version_id, company, is_included, reason)
      select ${this.workspaceId}::uuid, ${group.id}::uuid, company, is_included, reason
      from unnest(
        ${choices.map((choice) => choice.company)}::text[],
        ${choices.map((choice) => choice.isIncluded)}::boolean[],
        ${choices.map((choice) => choice.reason)}::text[]
      ) as line(company, is_included, reason)`.execute(this.db);
  }

  find(id: string): Promise<PeerGroupRow | undefined> {
    return this.groups().where('peerGroupVersion.id', '=', id).executeTakeFirst();
  }

  latest(): Promise<PeerGroupRow | undefined> {
    return this.groups().orderBy('peerGroupVersion.number', 'desc').limit(1).executeTakeFirst();
  }

  list(): Promise<PeerGroupRow[]> {
    return this.groups().orderBy('peerGroupVersion.number', 'desc').execute();
  }

  choices(groupId: string): Promise<PeerChoiceRow[]> {
    return this.db
      .selectFrom('peerChoice')
      .select(['company', 'isIncluded', 'reason'])
      .where('workspaceId', '=', this.workspaceId)
      .where('peerGroupVersionId', '=', groupId)
      .orderBy('company')
      .execute();
  }

  private groups() {
    return this.db
      .selectFrom('peerGroupVersion')
      .innerJoin('person', 'person.id', 'peerGroupVersion.createdBy')
      .select([
        'peerGroupVersion.id',
        'peerGroupVersion.number',
        'peerGroupVersion.parentId',
        'peerGroupVersion.panelVersionId',
        'peerGroupVersion.ownCompany',
        'peerGroupVersion.note',
        'peerGroupVersion.peerCount',
        'peerGroupVersion.createdAt',
        'person.name as createdByName',
      ])
      .where('peerGroupVersion.workspaceId', '=', this.workspaceId);
  }
}
