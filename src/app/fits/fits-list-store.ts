import { Injectable, inject, signal } from '@angular/core';
import type { FitSummary, PanelVersionSummary, PeerGroupSummary } from '@contract';
import { firstValueFrom } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../api/api-problem';
import { FitsApi } from '../api/fits-api';
import { PanelsApi } from '../api/panels-api';
import { PeersApi } from '../api/peers-api';

/** A fit with the versions it stands on. */
export interface ListedFit {
  readonly fit: FitSummary;
  readonly peerGroup: PeerGroupSummary | undefined;
  readonly panelVersion: PanelVersionSummary | undefined;
}

export type FitsListView =
  | { readonly kind: 'loading' }
  | { readonly kind: 'ready'; readonly fits: readonly ListedFit[] }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** All fits of the workspace, newest first. */
@Injectable()
export class FitsListStore {
  readonly #fits = inject(FitsApi);
  readonly #peers = inject(PeersApi);
  readonly #panels = inject(PanelsApi);
  readonly #view = signal<FitsListView>({ kind: 'loading' });
  readonly view = this.#view.asReadonly();

  async load(): Promise<void> {
    try {
      const [{ fits }, peers, panels] = await Promise.all([
        firstValueFrom(this.#fits.list()),
        firstValueFrom(this.#peers.list()),
        firstValueFrom(this.#panels.versions()),
      ]);
      const groups = new Map(peers.versions.map((group) => [group.id, group]));
      const versions = new Map(panels.versions.map((version) => [version.id, version]));
      this.#view.set({
        kind: 'ready',
        fits: fits.map((fit) => ({
          fit,
          peerGroup: groups.get(fit.peerGroupId),
          panelVersion: versions.get(fit.panelVersionId),
        })),
      });
    } catch (error) {
      this.#view.set({ kind: 'failed', problem: toApiProblem(error) });
    }
  }
}
