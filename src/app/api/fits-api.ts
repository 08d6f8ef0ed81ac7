import { Injectable, inject } from '@angular/core';
import {
  Bootstrap,
  EvidenceReply,
  EvidenceStateReply,
  FitReply,
  FitsReply,
  type StartBootstrap,
  type StartFit,
  apiRoutes,
} from '@contract';
import { type Observable, concat, exhaustMap, of, switchMap, takeWhile, timer } from 'rxjs';
import type * as z from 'zod';
import { ApiClient, addressOf } from './api-client';

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

  readEvidence(fitId: string): Observable<EvidenceReply> {
    return this.#client.call(apiRoutes.readEvidence, EvidenceReply, { path: { fitId } });
  }

  /**
   * The evidence as it is now. While it or a bootstrap beside it is under way its small state is asked for again and
   * again, and the evidence once more at the end; completes then.
   */
  followEvidence(fitId: string): Observable<EvidenceReply> {
    return this.readEvidence(fitId).pipe(
      switchMap((reply) =>
        isUnderWay(reply) ? concat(of(reply), this.#followState(fitId, reply)) : of(reply),
      ),
    );
  }

  #followState(fitId: string, reply: EvidenceReply): Observable<EvidenceReply> {
    const isStill = (now: EvidenceStateReply): boolean =>
      now.state === reply.state && isUnderWay(now);
    return timer(lookEveryMs, lookEveryMs).pipe(
      exhaustMap(() =>
        this.#client.call(apiRoutes.readEvidenceState, EvidenceStateReply, { path: { fitId } }),
      ),
      takeWhile(isStill, true),
      switchMap((now) => {
        if (!isStill(now)) return this.followEvidence(fitId);
        return of(reply.state === 'ready' ? { ...reply, bootstrap: now.bootstrap } : reply);
      }),
    );
  }

  startBootstrap(fitId: string, body: z.input<typeof StartBootstrap>): Observable<Bootstrap> {
    return this.#client.call(apiRoutes.startBootstrap, Bootstrap, { path: { fitId }, body });
  }

  cancelBootstrap(fitId: string): Observable<void> {
    return this.#client.send(apiRoutes.cancelBootstrap, { path: { fitId } });
  }

  /** Where the browser finds the fit's replication pack. */
  replicationAddress(fitId: string): string {
    return addressOf(apiRoutes.downloadReplication, { fitId });
  }
}

function isUnderWay(reply: EvidenceReply | EvidenceStateReply): boolean {
  if (reply.state !== 'ready') return reply.state === 'computing';
  return reply.bootstrap?.state === 'queued' || reply.bootstrap?.state === 'running';
}
