import type { Kysely } from 'kysely';
import { withNamedErrors } from '../errors';
import type { Database } from '../schema/database';

export interface MemberRow {
  readonly personId: string;
  readonly name: string;
  readonly email: string;
  readonly roles: readonly string[];
  readonly joinedAt: Date;
}

export interface InvitationRow {
  readonly id: string;
  readonly email: string;
  readonly roles: readonly string[];
  readonly createdAt: Date;
  readonly expiresAt: Date;
  readonly acceptedAt: Date | null;
  readonly withdrawnAt: Date | null;
}

/** The workspace itself, its members and its invitations. */
export class MembersRepository {
  constructor(
    private readonly db: Kysely<Database>,
    private readonly workspaceId: string,
  ) {}

  async insertWorkspace(name: string): Promise<void> {
    await this.db.insertInto('workspace').values({ workspaceId: this.workspaceId, name }).execute();
  }

  workspace(): Promise<{ name: string; createdAt: Date } | undefined> {
    return this.db
      .selectFrom('workspace')
      .select(['name', 'createdAt'])
      .where('workspaceId', '=', this.workspaceId)
      .executeTakeFirst();
  }

  /** Makes changes that count or number things in this workspace wait for one another. */
  async lockWorkspace(): Promise<void> {
    await this.db
      .selectFrom('workspace')
      .select('workspaceId')
      .where('workspaceId', '=', this.workspaceId)
      // Not a full lock: rows that refer to the workspace are written meanwhile.
      .forNoKeyUpdate()
      .execute();
  }

  async add(personId: string, roles: readonly string[]): Promise<void> {
    await withNamedErrors(() =>
      this.db
        .insertInto('membership')
        .values({ workspaceId: this.workspaceId, personId, roles: [...roles] })
        .execute(),
    );
  }

  find(personId: string): Promise<MemberRow | undefined> {
    return this.members().where('membership.personId', '=', personId).executeTakeFirst();
  }

  list(): Promise<MemberRow[]> {
    return this.members().orderBy('membership.joinedAt').execute();
  }

  async changeRoles(personId: string, roles: readonly string[]): Promise<boolean> {
    const result = await this.db
      .updateTable('membership')
      .set({ roles: [...roles] })
      .where('workspaceId', '=', this.workspaceId)
      .where('personId', '=', personId)
      .executeTakeFirst();
    return result.numUpdatedRows > 0n;
  }

  async remove(personId: string): Promise<boolean> {
    const result = await this.db
      .deleteFrom('membership')
      .where('workspaceId', '=', this.workspaceId)
      .where('personId', '=', personId)
      .executeTakeFirst();
    return result.numDeletedRows > 0n;
  }

  /** @throws {UniqueViolation} when an invitation to this address is open. */
  async insertInvitation(invitation: {
    readonly id: string;
    readonly tokenHash: Buffer;
    readonly email: string;
    readonly roles: readonly string[];
    readonly createdBy: string;
    readonly createdAt: Date;
    readonly expiresAt: Date;
  }): Promise<void> {
    await withNamedErrors(() =>
      this.db
        .insertInto('invitation')
        .values({ ...invitation, roles: [...invitation.roles], workspaceId: this.workspaceId })
        .execute(),
    );
  }

  findInvitationByToken(tokenHash: Buffer): Promise<InvitationRow | undefined> {
    return this.invitations().where('tokenHash', '=', tokenHash).forUpdate().executeTakeFirst();
  }

  /** Invitations neither accepted nor withdrawn, expired ones among them. */
  openInvitations(): Promise<InvitationRow[]> {
    return this.invitations()
      .where('acceptedAt', 'is', null)
      .where('withdrawnAt', 'is', null)
      .orderBy('createdAt')
      .execute();
  }

  async markAccepted(id: string, at: Date): Promise<void> {
    await this.db
      .updateTable('invitation')
      .set({ acceptedAt: at })
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .execute();
  }

  async withdrawInvitation(id: string, at: Date): Promise<boolean> {
    const result = await this.db
      .updateTable('invitation')
      .set({ withdrawnAt: at })
      .where('workspaceId', '=', this.workspaceId)
      .where('id', '=', id)
      .where('acceptedAt', 'is', null)
      .where('withdrawnAt', 'is', null)
      .executeTakeFirst();
    return result.numUpdatedRows > 0n;
  }

  private members() {
    return this.db
      .selectFrom('membership')
      .innerJoin('person', 'person.id', 'membership.personId')
      .select([
        'membership.personId',
        'person.name',
        'person.email',
        'membership.roles',
        'membership.joinedAt',
      ])
      .where('membership.workspaceId', '=', this.workspaceId);
  }

  private invitations() {
    return this.db
      .selectFrom('invitation')
      .select(['id', 'email', 'roles', 'createdAt', 'expiresAt', 'acceptedAt', 'withdrawnAt'])
      .where('workspaceId', '=', this.workspaceId);
  }
}
