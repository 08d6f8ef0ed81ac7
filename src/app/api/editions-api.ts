import { Injectable, inject } from '@angular/core';
import { EditionReply, EditionsReply, type PublishEdition, apiRoutes } from '@contract';
import type { Observable } from 'rxjs';
import { ApiClient } from './api-client';

/** Editions of the board. */
@Injectable({ providedIn: 'root' })
export class EditionsApi {
  readonly #client = inject(ApiClient);

  list(): Observable<EditionsReply> {
    return this.#client.call(apiRoutes.listEditions, EditionsReply);
  }

  read(editionId: string): Observable<EditionReply> {
    return this.#client.call(apiRoutes.readEdition, EditionReply, { path: { editionId } });
  }

  publish(body: PublishEdition): Observable<EditionReply> {
    return this.#client.call(apiRoutes.publishEdition, EditionReply, { body });
  }

  sign(editionId: string, password: string): Observable<EditionReply> {
    return this.#client.call(apiRoutes.signEdition, EditionReply, {
      path: { editionId },
      body: { password },
    });
  }

  sendBack(editionId: string, comment: string): Observable<EditionReply> {
    return this.#client.call(apiRoutes.returnEdition, EditionReply, {
      path: { editionId },
      body: { comment },
    });
  }
}
