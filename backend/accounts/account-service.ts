import { randomUUID } from 'node:crypto';
import { UniqueViolation } from '../../db/errors';
import type { Membership, Repositories } from '../../db/repositories/repositories';
import { record } from '../activity/activity';
import { Conflict, NotSignedIn, AppError } from '../errors/app-error';
import type { JobQueue } from '../jobs/job-queue';
import type { Passwords } from './passwords';
import type { SignInThrottle } from './sign-in-throttle';

export interface AccountPreferences {
  readonly theme: 'system' | 'light' | 'dark';
  readonly unit: 'units' | 'thousands' | 'millions' | 'billions';
  readonly negatives: 'minus' | 'parentheses';
}

export interface Account {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly preferences: AccountPreferences;
}

export const startingPreferences: AccountPreferences = {
  theme: 'system',
  unit: 'millions',
  negatives: 'minus',
};

export interface AccountServiceDependencies {
  readonly repositories: Repositories;
  readonly passwords: Passwords;
  readonly throttle: SignInThrottle;
  readonly queue: JobQueue;
}

/** People signing up and in, and what they set for themselves. */
export class AccountService {
  constructor(private readonly uses: AccountServiceDependencies) {}

  /**
   * Creates a person and their workspace; the founder holds `billing_admin` and `analyst`.
   *
   * @throws {Conflict} when the address has an account.
   */
  async signUp(request: {
    readonly name: string;
    readonly email: string;
    readonly password: string;
    readonly workspaceName: string;
  }): Promise<{ readonly personId: string; readonly workspaceId: string }> {
    const passwordHash = await this.uses.passwords.hash(request.password);
    const personId = randomUUID();
    const workspaceId = randomUUID();
    await this.uses.repositories
      .inWorkspace(workspaceId, async (tx) => {
        await tx.people.insert({
          id: personId,
          name: request.name,
          email: request.email,
          passwordHash,
          preferences: startingPreferences,
        });
        await tx.members.insertWorkspace(request.workspaceName);
        await tx.members.add(personId, ['billing_admin', 'analyst']);
        await record(tx, personId, 'workspace-created', workspaceId);
        await this.uses.queue.enqueue(tx, 'open-billing-account', workspaceId);
      })
      .catch((error: unknown) => {
        if (error instanceof UniqueViolation)
          throw new Conflict('This e-mail address has an account already. Sign in instead.');
        throw error;
      });
    this.uses.queue.wake('open-billing-account');
    return { personId, workspaceId };
  }

  /**
   * Checks address and password, taking as long for an unknown address as for a wrong password.
   *
   * @throws {AppError} `wrong-credentials`; {TooManyRequests} after repeated failures.
   */
  async signIn(
    email: string,
    password: string,
    address: string,
  ): Promise<{ readonly personId: string; readonly workspaceId: string }> {
    const { repositories, throttle } = this.uses;
    const account = { kind: 'account', value: email } as const;
    const keys = [account, { kind: 'address', value: address } as const];
    await throttle.countTry(keys);
    const person = await repositories.people.findByEmail(email);
    if (!(await this.uses.passwords.matches(person?.passwordHash, password)) || !person) {
      throw new AppError(
        'wrong-credentials',
        401,
        'No account has this e-mail address and password together.',
      );
    }
    await throttle.succeeded(keys);
    const membership = (await repositories.membershipsOf(person.id))[0];
    if (membership === undefined)
      throw new AppError(
        'forbidden',
        403,
        'This account belongs to no workspace any more. Ask a billing admin for an invitation.',
      );
    await repositories.inWorkspace(membership.workspaceId, (tx) =>
      record(tx, person.id, 'signed-in', person.id),
    );
    return { personId: person.id, workspaceId: membership.workspaceId };
  }

  /**
   * Whether this is the person's password: asked again before a signature and before joining a workspace.
   *
   * @throws {TooManyRequests} after repeated failures, counted together with those of signing in.
   */
  async confirmPassword(personId: string, password: string): Promise<boolean> {
    const person = await this.uses.repositories.people.find(personId);
    const account = { kind: 'account', value: person?.email ?? personId } as const;
    await this.uses.throttle.countTry([account]);
    const isRight = await this.uses.passwords.matches(person?.passwordHash, password);
    if (isRight) await this.uses.throttle.succeeded([account]);
    return isRight;
  }

  /** @throws {NotSignedIn} when the person does not exist. */
  async account(personId: string): Promise<Account> {
    const person = await this.uses.repositories.people.find(personId);
    if (person === undefined) throw new NotSignedIn();
    return {
      id: person.id,
      name: person.name,
      email: person.email,
      preferences: { ...startingPreferences, ...person.preferences },
    };
  }

  async membership(personId: string, workspaceId: string): Promise<Membership | undefined> {
    const memberships = await this.uses.repositories.membershipsOf(personId);
    return memberships.find((membership) => membership.workspaceId === workspaceId);
  }

  async changePreferences(personId: string, preferences: AccountPreferences): Promise<void> {
    await this.uses.repositories.people.changePreferences(personId, preferences);
  }
}
