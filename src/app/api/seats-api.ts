import { Injectable, inject } from '@angular/core';
import { SeatsReply, apiRoutes } from '@contract';
import type { Observable } from 'rxjs';
import { ApiClient } from './api-client';

/** Seats and what they cost. */
@Injectable({ providedIn: 'root' })
export class SeatsApi {
  readonly #client = inject(ApiClient);

  read(): Observable<SeatsReply> {
    return this.#client.call(apiRoutes.readSeats, SeatsReply);
  }
}
