import { Injectable, inject } from '@angular/core';
import {
  type AcceptInvitation,
  InvitationView,
  SessionReply,
  type SignIn,
  type SignUp,
  apiRoutes,
} from '@contract';
import type { Observable } from 'rxjs';
import { ApiClient } from './api-client';

/** Signing up, in, and joining by a link. */
@Injectable({ providedIn: 'root' })
export class AccountsApi {
  readonly #client = inject(ApiClient);

  signIn(body: SignIn): Observable<SessionReply> {
    return this.#client.call(apiRoutes.signIn, SessionReply, { body });
  }

  signUp(body: SignUp): Observable<SessionReply> {
    return this.#client.call(apiRoutes.signUp, SessionReply, { body });
  }

  viewInvitation(token: string): Observable<InvitationView> {
    return this.#client.call(apiRoutes.viewInvitation, InvitationView, { body: { token } });
  }

  acceptInvitation(body: AcceptInvitation): Observable<SessionReply> {
    return this.#client.call(apiRoutes.acceptInvitation, SessionReply, { body });
  }
}
