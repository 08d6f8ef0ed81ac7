import { Injectable, inject } from '@angular/core';
import { FitReply, FitsReply, type StartFit, apiRoutes } from '@contract';
import { type Observable, exhaustMap, takeWhile, timer } from 'rxjs';
import type * as z from 'zod';
import { ApiClient } from './api-client';

const lookEveryMs = 400;

/** Fits: start one, follow it, read it. */
@Injectable({ providedIn: 'root' })
export class FitsApi {
  readonly #client = inject(ApiClient);

  list(): Observable<FitsReply> {
    return this.#client.call(apiRoutes.listFits, FitsReply);
  }

  start(body: z.input<typeof StartFit>): Observable<FitReply> {
    return this.#client.call(apiRoutes.startFit, FitReply, { body });
  }

  read(fitId: string): Observable<FitReply> {
    return this.#client.call(apiRoutes.readFit, FitReply, { path: { fitId } });
  }

  /** The fit as it is now, and again while it is queued or running; completes with its end. */
  follow(fitId: string): Observable<FitReply> {
    return timer(0, lookEveryMs).pipe(
      exhaustMap(() => this.read(fitId)),
      takeWhile(({ fit }) => fit.state === 'queued' || fit.state === 'running', true),
    );
  }

  cancel(fitId: string): Observable<void> {
    return this.#client.send(apiRoutes.cancelFit, { path: { fitId } });
  }
}
