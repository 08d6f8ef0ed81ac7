import { Injectable, inject } from '@angular/core';
import { PeerTrialReply, type StartPeerTrial, apiRoutes } from '@contract';
import { type Observable, concat, exhaustMap, of, switchMap, takeWhile, timer } from 'rxjs';
import type * as z from 'zod';
import { ApiClient } from './api-client';

const lookEveryMs = 500;

/** Peer groups that are tried out before they are saved. */
@Injectable({ providedIn: 'root' })
export class PeerTrialsApi {
  readonly #client = inject(ApiClient);

  /** Starts one, or finds the one that was asked the same, and follows it. */
  run(body: z.input<typeof StartPeerTrial>): Observable<PeerTrialReply> {
    return this.#followed(this.#client.call(apiRoutes.startPeerTrial, PeerTrialReply, { body }));
  }

  /** The trial as it is now, and again while it is under way; completes with its end. */
  follow(peerTrialId: string): Observable<PeerTrialReply> {
    return this.#followed(this.#read(peerTrialId));
  }

  cancel(peerTrialId: string): Observable<void> {
    return this.#client.send(apiRoutes.cancelPeerTrial, { path: { peerTrialId } });
  }

  #read(peerTrialId: string): Observable<PeerTrialReply> {
    return this.#client.call(apiRoutes.readPeerTrial, PeerTrialReply, { path: { peerTrialId } });
  }

  #followed(first: Observable<PeerTrialReply>): Observable<PeerTrialReply> {
    return first.pipe(
      switchMap((trial) =>
        isUnderWay(trial)
          ? concat(
              of(trial),
              timer(lookEveryMs, lookEveryMs).pipe(
                exhaustMap(() => this.#read(trial.id)),
                takeWhile(isUnderWay, true),
              ),
            )
          : of(trial),
      ),
    );
  }
}

function isUnderWay({ state }: PeerTrialReply): boolean {
  return state === 'queued' || state === 'running';
}
