import { Injectable, inject, signal } from '@angular/core';
import type { InvitationView } from '@contract';
import { firstValueFrom } from 'rxjs';
import { AccountsApi } from '../api/accounts-api';
import { ApiProblem } from '../api/api-problem';

export type JoinView =
  | { readonly kind: 'loading' }
  /** The address holds no link's secret. */
  | { readonly kind: 'without-link' }
  | { readonly kind: 'open'; readonly token: string; readonly invitation: InvitationView }
  /** Used, withdrawn, expired or mistyped: the server does not say which. */
  | { readonly kind: 'closed' }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** What a link opens. Its secret stays here: it goes to the server in bodies only, never in an address. */
@Injectable()
export class JoinStore {
  readonly #accounts = inject(AccountsApi);
  readonly #view = signal<JoinView>({ kind: 'loading' });
  #token = '';

  readonly view = this.#view.asReadonly();

  async open(token: string): Promise<void> {
    this.#token = token;
    await this.look();
  }

  /** Asks again what the link opens. */
  async look(): Promise<void> {
    const token = this.#token;
    if (token === '') {
      this.#view.set({ kind: 'without-link' });
      return;
    }
    this.#view.set({ kind: 'loading' });
    const view = await this.#read(token);
    if (token === this.#token) this.#view.set(view);
  }

  async #read(token: string): Promise<JoinView> {
    try {
      const invitation = await firstValueFrom(this.#accounts.viewInvitation(token));
      return { kind: 'open', token, invitation };
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      // A text longer than any link's secret is refused as a bad request: to the reader it is a link that is no good.
      const isClosed = error.slug === 'gone' || error.slug === 'bad-request';
      return isClosed ? { kind: 'closed' } : { kind: 'failed', problem: error };
    }
  }
}
