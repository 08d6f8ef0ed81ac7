import { Injectable, inject } from '@angular/core';
import { DeskReply, apiRoutes } from '@contract';
import type { Observable } from 'rxjs';
import { ApiClient } from './api-client';

/** The newest panel version, peer group version and fit of the workspace. */
@Injectable({ providedIn: 'root' })
export class DeskApi {
  readonly #client = inject(ApiClient);

  read(): Observable<DeskReply> {
    return this.#client.call(apiRoutes.readDesk, DeskReply);
  }
}
