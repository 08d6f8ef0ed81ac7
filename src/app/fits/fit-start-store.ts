import { Injectable, inject, signal } from '@angular/core';
import type { PanelVersionSummary, PeerGroupReply } from '@contract';
import { firstValueFrom } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../api/api-problem';
import { DeskApi } from '../api/desk-api';
import { PanelsApi } from '../api/panels-api';
import { PeersApi } from '../api/peers-api';
import { furtherColumns } from './further-columns';

/** What a fit can be started from. */
export interface FitGround {
  readonly peerGroup: PeerGroupReply;
  readonly panelVersion: PanelVersionSummary;
  /** Further numeric columns of the panel. */
  readonly columns: readonly string[];
}

export type FitStartView =
  | { readonly kind: 'loading' }
  | { readonly kind: 'no-panel' }
  | { readonly kind: 'no-peers' }
  /** There is a fit already: this one is shown. */
  | { readonly kind: 'found'; readonly fitId: string }
  | { readonly kind: 'offer'; readonly ground: FitGround }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** Finds the newest fit, or else what one can be started from. */
@Injectable()
export class FitStartStore {
  readonly #desk = inject(DeskApi);
  readonly #panels = inject(PanelsApi);
  readonly #peers = inject(PeersApi);
  readonly #view = signal<FitStartView>({ kind: 'loading' });

  readonly view = this.#view.asReadonly();
  /** Counts the loads, so that a reply that was overtaken changes nothing. */
  #loads = 0;

  /** The newest fit of the peer group version, or of all where none is given. */
  async load(peerGroupId: string | undefined): Promise<void> {
    const turn = ++this.#loads;
    this.#view.set({ kind: 'loading' });
    const view = await this.#read(peerGroupId).catch((error: unknown): FitStartView => ({
      kind: 'failed',
      problem: toApiProblem(error),
    }));
    if (turn === this.#loads) this.#view.set(view);
  }

  async #read(peerGroupId: string | undefined): Promise<FitStartView> {
    const desk = await firstValueFrom(this.#desk.read());
    if (desk.fit !== null && (peerGroupId === undefined || desk.fit.peerGroupId === peerGroupId))
      return { kind: 'found', fitId: desk.fit.id };
    if (desk.panelVersion === null) return { kind: 'no-panel' };
    const groupId = peerGroupId ?? desk.peerGroup?.id;
    if (groupId === undefined) return { kind: 'no-peers' };
    const peerGroup = await firstValueFrom(this.#peers.read(groupId));
    const panel = await firstValueFrom(this.#panels.version(peerGroup.panelVersionId));
    return {
      kind: 'offer',
      ground: { peerGroup, panelVersion: panel.version, columns: furtherColumns(panel) },
    };
  }
}
