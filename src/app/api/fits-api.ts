import { Injectable, inject } from '@angular/core';
import {
  Bootstrap,
  EvidenceReply,
  FitReply,
  FitsReply,
  type StartBootstrap,
  type StartFit,
  apiRoutes,
} from '@contract';
import { type Observable, exhaustMap, takeWhile, timer } from 'rxjs';
import type * as z from 'zod';
import { ApiClient, addressOf } from './api-client';

const lookEveryMs = 400;

/** Evidence of a large panel is a megabyte: it is asked for less often. */
const lookForEvidenceEveryMs = 1000;

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

  /** The evidence as it is now, and again while it or a bootstrap beside it is under way; completes with its end. */
  followEvidence(fitId: string): Observable<EvidenceReply> {
    return timer(0, lookForEvidenceEveryMs).pipe(
      exhaustMap(() => this.readEvidence(fitId)),
      takeWhile(isUnderWay, true),
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

function isUnderWay(reply: EvidenceReply): boolean {
  if (reply.state !== 'ready') return reply.state === 'computing';
  return reply.bootstrap?.state === 'queued' || reply.bootstrap?.state === 'running';
}
