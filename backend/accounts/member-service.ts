import { randomUUID } from 'node:crypto';
import { UniqueViolation } from '../../db/errors';
import type { InvitationRow, MemberRow } from '../../db/repositories/members-repository';
import type { Repositories, WorkspaceRepositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import { AppError, Conflict, Invalid, NotFound } from '../errors/app-error';
import type { Role } from './role';
import { type AccountService, startingPreferences } from './account-service';
import { createInvitationToken, readInvitationToken } from './invitation-token';
import type { Passwords } from './passwords';

const invitationMs = 72 * 3_600_000;

export interface MemberServiceDependencies {
  readonly repositories: Repositories;
  readonly passwords: Passwords;
  readonly accounts: AccountService;
  readonly now: () => Date;
}

/** Who belongs to a workspace, and the links that bring people in. */
export class MemberService {
  constructor(private readonly uses: MemberServiceDependencies) {}

  async list(
    workspaceId: string,
  ): Promise<{ readonly members: MemberRow[]; readonly invitations: InvitationRow[] }> {
    return this.uses.repositories.inWorkspace(workspaceId, async (tx) => ({
      members: await tx.members.list(),
      invitations: await tx.members.openInvitations(),
    }));
  }

  /**
   * Makes a single-use link, good for 72 hours; only its hash is kept.
   *
   * @throws {Conflict} when the address is a member's or has an open invitation.
   */
  async invite(
    workspaceId: string,
    byPersonId: string,
    email: string,
    roles: readonly Role[],
  ): Promise<{ readonly id: string; readonly token: string; readonly expiresAt: Date }> {
    const id = randomUUID();
    const now = this.uses.now();
    const expiresAt = new Date(now.getTime() + invitationMs);
    const { token, tokenHash } = createInvitationToken(workspaceId);
    await this.uses.repositories
      .inWorkspace(workspaceId, async (tx) => {
        await this.#withdrawExpired(tx, email, now);
        const members = await tx.members.list();
        if (members.some((member) => member.email === email))
          throw new Conflict(`${email} is a member already. Change the roles there.`);
        const invitation = {
          id,
          tokenHash,
          email,
          roles: unique(roles),
          createdAt: now,
          expiresAt,
        };
        await tx.members.insertInvitation({ ...invitation, createdBy: byPersonId });
        await record(tx, byPersonId, 'member-invited', id, { roles });
      })
      .catch((error: unknown) => {
        if (error instanceof UniqueViolation)
          throw new Conflict(
            `An invitation to ${email} is open already. Withdraw it to make a new link.`,
          );
        throw error;
      });
    return { id, token, expiresAt };
  }

  /** @throws {NotFound} when no such invitation is open. */
  async withdraw(workspaceId: string, byPersonId: string, invitationId: string): Promise<void> {
    await this.uses.repositories.inWorkspace(workspaceId, async (tx) => {
      if (!(await tx.members.withdrawInvitation(invitationId, this.uses.now())))
        throw new NotFound('This invitation is no longer open.');
      await record(tx, byPersonId, 'invitation-withdrawn', invitationId);
    });
  }

  /** @throws {AppError} `gone` for a link that is used, withdrawn, expired or unknown. */
  async view(token: string): Promise<{
    readonly workspaceName: string;
    readonly invitation: InvitationRow;
    readonly hasAccount: boolean;
  }> {
    const { workspaceId, tokenHash } = readInvitationToken(token) ?? invalidLink();
    return this.uses.repositories.inWorkspace(workspaceId, async (tx) => {
      const invitation = await this.#open(tx, tokenHash);
      const workspace = await tx.members.workspace();
      const account = await tx.people.findByEmail(invitation.email);
      return {
        workspaceName: workspace?.name ?? '',
        invitation,
        hasAccount: account !== undefined,
      };
    });
  }

  /**
   * Joins by a link: a new account takes the password given, an existing one is asked for its own.
   *
   * @throws {AppError} `gone` for a link no longer good; `wrong-credentials` for another password than the account's.
   */
  async accept(
    token: string,
    name: string | undefined,
    password: string,
  ): Promise<{ readonly personId: string; readonly workspaceId: string }> {
    const { workspaceId, tokenHash } = readInvitationToken(token) ?? invalidLink();
    const { invitation } = await this.view(token);
    const existing = await this.uses.repositories.people.findByEmail(invitation.email);
    // Hashing happens before the transaction: nothing slow is awaited while one is open.
    const passwordHash =
      existing === undefined ? await this.uses.passwords.hash(password) : undefined;
    if (existing && !(await this.uses.accounts.confirmPassword(existing.id, password)))
      throw new AppError('wrong-credentials', 401, 'This is not the password of your account.');
    if (existing === undefined && name === undefined)
      throw new Invalid('The request is not as expected.', [
        { pointer: '/name', detail: 'expected a name for the new account' },
      ]);
    const personId = existing?.id ?? randomUUID();
    await this.uses.repositories.inWorkspace(workspaceId, async (tx) => {
      const open = await this.#open(tx, tokenHash);
      if (passwordHash !== undefined)
        await tx.people.insert({
          id: personId,
          name: name ?? '',
          email: open.email,
          passwordHash,
          preferences: startingPreferences,
        });
      await tx.members.add(personId, open.roles);
      await tx.members.markAccepted(open.id, this.uses.now());
      await record(tx, personId, 'member-joined', personId, { roles: open.roles });
    });
    return { personId, workspaceId };
  }

  /** @throws {NotFound}; {Conflict} when no billing admin would be left. */
  async changeRoles(
    workspaceId: string,
    byPersonId: string,
    personId: string,
    roles: readonly Role[],
  ): Promise<void> {
    await this.uses.repositories.inWorkspace(workspaceId, async (tx) => {
      await tx.members.lockWorkspace();
      const before = await tx.members.find(personId);
      if (before === undefined) throw new NotFound('This person is no member.');
      if (!roles.includes('billing_admin')) await assertAnotherBillingAdmin(tx, personId);
      await tx.members.changeRoles(personId, unique(roles));
      await record(tx, byPersonId, 'roles-changed', personId, {
        before: before.roles,
        after: roles,
      });
    });
  }

  /** Ends the membership and the person's sessions. @throws {NotFound}; {Conflict} for the last billing admin. */
  async remove(workspaceId: string, byPersonId: string, personId: string): Promise<void> {
    await this.uses.repositories.inWorkspace(workspaceId, async (tx) => {
      await tx.members.lockWorkspace();
      await assertAnotherBillingAdmin(tx, personId);
      if (!(await tx.members.remove(personId))) throw new NotFound('This person is no member.');
      await record(tx, byPersonId, 'member-removed', personId);
    });
    await this.uses.repositories.endSessions(personId);
  }

  async #open(tx: WorkspaceRepositories, tokenHash: Buffer): Promise<InvitationRow> {
    const invitation = await tx.members.findInvitationByToken(tokenHash);
    if (invitation === undefined) return invalidLink();
    const { acceptedAt, withdrawnAt, expiresAt } = invitation;
    if (acceptedAt !== null || withdrawnAt !== null || expiresAt <= this.uses.now())
      return invalidLink();
    return invitation;
  }

  async #withdrawExpired(tx: WorkspaceRepositories, email: string, now: Date): Promise<void> {
    for (const open of await tx.members.openInvitations())
      if (open.email === email && open.expiresAt <= now)
        await tx.members.withdrawInvitation(open.id, now);
  }
}

async function assertAnotherBillingAdmin(
  tx: WorkspaceRepositories,
  personId: string,
): Promise<void> {
  const members = await tx.members.list();
  const others = members.filter(
    (member) => member.personId !== personId && member.roles.includes('billing_admin'),
  );
  if (others.length === 0)
    throw new Conflict('The last billing admin stays. Give the role to somebody else first.');
}

function unique(roles: readonly Role[]): Role[] {
  return [...new Set(roles)];
}

function invalidLink(): never {
  throw new AppError(
    'gone',
    410,
    'This link has been used, was withdrawn or has expired. Ask your billing admin for a new one.',
  );
}
