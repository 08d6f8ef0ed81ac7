import { Injectable, inject, signal } from '@angular/core';
import { type MembersReply, type Role, landingPath } from '@contract';
import { type Observable, firstValueFrom } from 'rxjs';
import { ApiProblem } from '../api/api-problem';
import { MembersApi } from '../api/members-api';
import { SessionStore } from '../api/session-store';
import type { ShownProblem } from '../ui/problem';

export type MembersView =
  | { readonly kind: 'loading' }
  | { readonly kind: 'ready'; readonly reply: MembersReply }
  | { readonly kind: 'failed'; readonly problem: ShownProblem };

export type Member = MembersReply['members'][number];
export type Invitation = MembersReply['invitations'][number];

/** A link as it was made; it is in no later answer of the server. */
export interface NewLink {
  readonly email: string;
  /** What follows `#` in the link. */
  readonly token: string;
  readonly expiresAt: string;
}

/** Members and open invitations; one for each visit of the page, so that a link is forgotten on leaving it. */
@Injectable()
export class MembersStore {
  readonly #api = inject(MembersApi);
  readonly #session = inject(SessionStore);
  readonly #view = signal<MembersView>({ kind: 'loading' });
  readonly #link = signal<NewLink | null>(null);

  readonly view = this.#view.asReadonly();
  readonly link = this.#link.asReadonly();

  async load(): Promise<void> {
    this.#view.set({ kind: 'loading' });
    await this.#read();
  }

  forgetLink(): void {
    this.#link.set(null);
  }

  /** @returns the problem that kept the invitation from being made, or null. */
  invite(email: string, roles: readonly Role[]): Promise<ShownProblem | null> {
    return this.#change('The invitation was not made', async () => {
      const created = await firstValueFrom(this.#api.invite({ email, roles: [...roles] }));
      this.#link.set({ email, token: created.token, expiresAt: created.expiresAt });
    });
  }

  withdraw(invitation: Invitation): Promise<ShownProblem | null> {
    return this.#change('The invitation was not withdrawn', async () => {
      await done(this.#api.withdraw(invitation.id));
      // The link of a withdrawn invitation opens nothing any more.
      if (this.#link()?.email === invitation.email) this.#link.set(null);
    });
  }

  remove(member: Member): Promise<ShownProblem | null> {
    return this.#change(`${member.name} was not removed`, () =>
      done(this.#api.remove(member.personId)),
    );
  }

  /**
   * Changes roles; one's own hold at once.
   *
   * @returns the problem that kept them as they were; or where the person has to go when this page is closed to them now.
   */
  async changeRoles(
    member: Member,
    roles: readonly Role[],
  ): Promise<{ readonly problem: ShownProblem | null; readonly leaveTo: string | null }> {
    const keepsPage = !member.isYou || roles.includes('billing_admin');
    const problem = await this.#change(
      'The roles were not changed',
      async () => {
        await done(this.#api.changeRoles(member.personId, { roles: [...roles] }));
        const session = this.#session.session();
        if (member.isYou && session !== null)
          this.#session.accept({ session: { ...session, roles: [...roles] } });
      },
      { readAgain: keepsPage },
    );
    return { problem, leaveTo: problem === null && !keepsPage ? landingPath(roles) : null };
  }

  /** @param failure  title of what was wanted and did not happen. */
  async #change(
    failure: string,
    work: () => Promise<void>,
    options: { readonly readAgain: boolean } = { readAgain: true },
  ): Promise<ShownProblem | null> {
    try {
      await work();
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      return { ...error.shown, title: failure };
    }
    if (options.readAgain) await this.#read();
    return null;
  }

  /** Leaves what is shown in its place until the answer is there. */
  async #read(): Promise<void> {
    try {
      this.#view.set({ kind: 'ready', reply: await firstValueFrom(this.#api.list()) });
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.#view.set({ kind: 'failed', problem: error.shown });
    }
  }
}

function done(call: Observable<void>): Promise<void> {
  return firstValueFrom(call);
}
