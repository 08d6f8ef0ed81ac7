import { Injectable, inject } from '@angular/core';
import { PeerGroupReply, PeerGroupsReply, type SavePeerGroup, apiRoutes } from '@contract';
import type { Observable } from 'rxjs';
import { ApiClient } from './api-client';

/** Peer group versions. */
@Injectable({ providedIn: 'root' })
export class PeersApi {
  readonly #client = inject(ApiClient);

  list(): Observable<PeerGroupsReply> {
    return this.#client.call(apiRoutes.listPeerGroups, PeerGroupsReply);
  }

  read(peerGroupId: string): Observable<PeerGroupReply> {
    return this.#client.call(apiRoutes.readPeerGroup, PeerGroupReply, { path: { peerGroupId } });
  }

  save(body: SavePeerGroup): Observable<PeerGroupReply> {
    return this.#client.call(apiRoutes.savePeerGroup, PeerGroupReply, { body });
  }
}
