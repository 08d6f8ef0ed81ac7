import { Injectable, inject, signal } from '@angular/core';
import type { FitSummary, PanelVersionSummary, PeerGroupReply, PeerGroupSummary } from '@contract';
import { firstValueFrom } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../../api/api-problem';
import { FitsApi } from '../../api/fits-api';
import { PanelsApi } from '../../api/panels-api';
import { PeersApi } from '../../api/peers-api';
import type { PanelCompany } from '../peer-draft';

/** A version with the panel it stands on and the fits that came of it. */
export interface SideVersion {
  readonly group: PeerGroupReply;
  readonly panel: PanelVersionSummary;
  /** Of that panel version. */
  readonly companies: readonly PanelCompany[];
  /** Those that are done, newest first. */
  readonly fits: readonly FitSummary[];
}

export type CompareView =
  | { readonly kind: 'loading' }
  /** Fewer than two versions are saved. */
  | { readonly kind: 'too-few' }
  | {
      readonly kind: 'ready';
      /** Newest first. */
      readonly versions: readonly PeerGroupSummary[];
      readonly a: SideVersion;
      readonly b: SideVersion;
    }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** Two versions of the peer group side by side. */
@Injectable()
export class CompareStore {
  readonly #peers = inject(PeersApi);
  readonly #panels = inject(PanelsApi);
  readonly #fits = inject(FitsApi);
  readonly #view = signal<CompareView>({ kind: 'loading' });
  /** Counts the loads, so that a reply that was overtaken changes nothing. */
  #loads = 0;

  readonly view = this.#view.asReadonly();

  /** Loads the two versions with these ids; where one is not named, the newest and the one before it. */
  async load(a: string | undefined, b: string | undefined): Promise<void> {
    const turn = ++this.#loads;
    // Two versions stay on the screen while others are fetched: the lists to choose from keep the focus.
    if (this.#view().kind !== 'ready') this.#view.set({ kind: 'loading' });
    const view = await this.#read(a, b).catch((error: unknown): CompareView => ({
      kind: 'failed',
      problem: toApiProblem(error),
    }));
    if (turn === this.#loads) this.#view.set(view);
  }

  async #read(a: string | undefined, b: string | undefined): Promise<CompareView> {
    const [{ versions }, { versions: panels }, { fits }] = await Promise.all([
      firstValueFrom(this.#peers.list()),
      firstValueFrom(this.#panels.versions()),
      firstValueFrom(this.#fits.list()),
    ]);
    if (versions.length < 2) return { kind: 'too-few' };
    const second = b ?? versions[0].id;
    const before = versions.find(({ id }) => id !== second)?.id ?? second;
    const [first, last] = await Promise.all(
      [a ?? before, second].map((id) => this.#side(id, panels, fits)),
    );
    return { kind: 'ready', versions, a: first, b: last };
  }

  async #side(
    id: string,
    panels: readonly PanelVersionSummary[],
    fits: readonly FitSummary[],
  ): Promise<SideVersion> {
    const group = await firstValueFrom(this.#peers.read(id));
    const panel = panels.find((version) => version.id === group.panelVersionId);
    if (panel === undefined) throw new Error(`peer group ${id} stands on no panel version known`);
    const { companies } = await firstValueFrom(this.#panels.companies(panel.id));
    return {
      group,
      panel,
      companies,
      fits: fits.filter(({ peerGroupId, state }) => peerGroupId === id && state === 'done'),
    };
  }
}
