import { Injectable, inject } from '@angular/core';
import {
  type ChangeRoles,
  InvitationCreated,
  type InviteMember,
  MembersReply,
  apiRoutes,
} from '@contract';
import type { Observable } from 'rxjs';
import { ApiClient } from './api-client';

/** Members, their roles, and the invitations that bring people in. */
@Injectable({ providedIn: 'root' })
export class MembersApi {
  readonly #client = inject(ApiClient);

  list(): Observable<MembersReply> {
    return this.#client.call(apiRoutes.listMembers, MembersReply);
  }

  invite(body: InviteMember): Observable<InvitationCreated> {
    return this.#client.call(apiRoutes.inviteMember, InvitationCreated, { body });
  }

  withdraw(invitationId: string): Observable<void> {
    return this.#client.send(apiRoutes.withdrawInvitation, { path: { invitationId } });
  }

  changeRoles(personId: string, body: ChangeRoles): Observable<void> {
    return this.#client.send(apiRoutes.changeRoles, { path: { personId }, body });
  }

  remove(personId: string): Observable<void> {
    return this.#client.send(apiRoutes.removeMember, { path: { personId } });
  }
}
