import { Injectable, computed, inject, signal } from '@angular/core';
import type { PeerGroupReply, PeerGroupSummary } from '@contract';
import { firstValueFrom } from 'rxjs';
import { ApiProblem, toApiProblem } from '../api/api-problem';
import { DeskApi } from '../api/desk-api';
import { FitsApi } from '../api/fits-api';
import { PanelsApi } from '../api/panels-api';
import { PeersApi } from '../api/peers-api';
import {
  type DraftChoice,
  type PanelCompany,
  type PeerDraft,
  changeChoice,
  changeChoices,
  isChanged,
  isSameDraft,
  lostCompanies,
  moveDraft,
  reasonsWritten,
  startDraft,
  toSavePeerGroup,
} from './peer-draft';
import { type PeersGround, standingsWithout } from './peers-ground';

export type PeersView =
  | { readonly kind: 'idle' }
  | { readonly kind: 'loading' }
  | { readonly kind: 'no-panel' }
  | { readonly kind: 'ready'; readonly ground: PeersGround; readonly draft: PeerDraft }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** Somebody saved a version meanwhile. */
export interface StaleVersion {
  readonly latestId: string;
  readonly detail: string;
}

/** The choice of peers: what is saved, what is on the screen, and the way from one to the other. */
@Injectable()
export class PeersStore {
  readonly #peers = inject(PeersApi);
  readonly #panels = inject(PanelsApi);
  readonly #desk = inject(DeskApi);
  readonly #fits = inject(FitsApi);
  readonly #view = signal<PeersView>({ kind: 'idle' });
  readonly #isSaving = signal(false);
  readonly #problem = signal<ApiProblem | null>(null);
  readonly #stale = signal<StaleVersion | null>(null);
  #parentId: string | null = null;
  /** Counts what was asked for, so that a reply that was overtaken changes nothing. */
  #loads = 0;
  #moves = 0;

  readonly view = this.#view.asReadonly();
  readonly isSaving = this.#isSaving.asReadonly();
  /** Why the last save did not work. */
  readonly problem = this.#problem.asReadonly();
  readonly stale = this.#stale.asReadonly();

  readonly isChanged = computed(() => {
    const view = this.#view();
    return view.kind === 'ready' && isChanged(view.draft, view.ground.saved);
  });
  /** Whether a person changed anything here; choices that only wait on a newer panel version are no loss. */
  readonly hasInput = computed(() => {
    const view = this.#view();
    if (view.kind !== 'ready') return false;
    const { companies, saved } = view.ground;
    const untouched = startDraft(view.draft.panelVersionId, companies, saved);
    return !isSameDraft(view.draft, untouched);
  });
  /** Of the draft's panel version. */
  readonly companies = computed((): readonly PanelCompany[] => {
    const view = this.#view();
    return view.kind === 'ready' ? view.ground.companies : [];
  });
  readonly ownCompany = computed(() => {
    const view = this.#view();
    return view.kind === 'ready' ? view.draft.ownCompany : '';
  });
  readonly reasons = computed(() => {
    const view = this.#view();
    return view.kind === 'ready' ? reasonsWritten(view.draft) : [];
  });
  readonly lost = computed(() => {
    const view = this.#view();
    return view.kind === 'ready' ? lostCompanies(view.ground.saved, view.ground.companies) : [];
  });

  /**
   * Loads the version with this id, or the newest. `isOnNewestPanel` puts its choices on the newest panel version,
   * ready to be saved; otherwise they stand on the version's own.
   */
  async load(peerGroupId: string | undefined, isOnNewestPanel: boolean): Promise<void> {
    const turn = ++this.#loads;
    this.#moves++;
    this.#view.set({ kind: 'loading' });
    this.#problem.set(null);
    this.#stale.set(null);
    try {
      const view = await this.#read(peerGroupId, isOnNewestPanel);
      if (turn !== this.#loads) return;
      // What is saved next comes after the newest version known here, whichever version is shown.
      if (view.kind === 'ready') this.#parentId = view.ground.versions[0]?.id ?? null;
      this.#view.set(view);
    } catch (error) {
      const problem = toApiProblem(error);
      if (turn === this.#loads) this.#view.set({ kind: 'failed', problem });
    }
  }

  async choosePanelVersion(panelVersionId: string): Promise<void> {
    if (this.#view().kind !== 'ready') return;
    const turn = ++this.#moves;
    try {
      const { companies } = await firstValueFrom(this.#panels.companies(panelVersionId));
      const view = this.#view();
      if (turn !== this.#moves || view.kind !== 'ready') return;
      // The draft as it is now: reasons may have been written while the companies were fetched.
      const draft = moveDraft(view.draft, panelVersionId, companies);
      this.#view.set({ kind: 'ready', ground: { ...view.ground, companies }, draft });
    } catch (error) {
      const problem = toApiProblem(error);
      if (turn === this.#moves) this.#problem.set(problem);
    }
  }

  chooseOwnCompany(ownCompany: string): void {
    this.#change((draft) => ({ ...draft, ownCompany }));
  }

  /** Moves a company in or out, or writes its reason. */
  change(company: string, change: Partial<DraftChoice>): void {
    this.#change((draft) => changeChoice(draft, company, change));
  }

  /** Puts several companies on one side with one reason. */
  changeAll(companies: readonly string[], to: Parameters<typeof changeChoices>[2]): void {
    this.#change((draft) => changeChoices(draft, companies, to));
  }

  /** Puts the choices back to the version shown. */
  discardChanges(): void {
    const view = this.#view();
    if (view.kind !== 'ready') return;
    const { companies, saved } = view.ground;
    const draft = startDraft(view.draft.panelVersionId, companies, saved);
    this.#view.set({ ...view, draft });
  }

  /** Saves the choices as the next version. @returns its id, or null when it could not be saved. */
  async save(note: string): Promise<string | null> {
    const view = this.#view();
    if (view.kind !== 'ready') return null;
    this.#isSaving.set(true);
    this.#problem.set(null);
    try {
      const saved = await this.#save(view.draft, note);
      return saved.id;
    } catch (error) {
      this.#report(toApiProblem(error));
      return null;
    } finally {
      this.#isSaving.set(false);
    }
  }

  /** Saves the choices on top of the version that somebody else saved meanwhile. */
  async saveOnTop(note: string): Promise<string | null> {
    const stale = this.#stale();
    if (stale === null) return null;
    this.#parentId = stale.latestId;
    this.#stale.set(null);
    return this.save(note);
  }

  async #save(sent: PeerDraft, note: string): Promise<PeerGroupReply> {
    const loads = this.#loads;
    const body = toSavePeerGroup(sent, note, this.#parentId);
    const saved = await firstValueFrom(this.#peers.save(body));
    const listed = await this.#list();
    const view = this.#view();
    // Another version was opened meanwhile: it stays, with what belongs to it.
    if (loads !== this.#loads || view.kind !== 'ready') return saved;
    this.#parentId = saved.id;
    this.#stale.set(null);
    const versions = listed ?? [saved, ...view.ground.versions];
    const ground = { ...view.ground, saved, versions, without: null };
    const draft = isSameDraft(view.draft, sent)
      ? startDraft(saved.panelVersionId, ground.companies, saved)
      : view.draft;
    this.#view.set({ kind: 'ready', ground, draft });
    return saved;
  }

  /** @returns null where the list cannot be had: the version is saved all the same, and must not be called unsaved. */
  async #list(): Promise<readonly PeerGroupSummary[] | null> {
    try {
      return (await firstValueFrom(this.#peers.list())).versions;
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      return null;
    }
  }

  #report(problem: ApiProblem): void {
    const latestId = problem.problem['latestId'];
    if (problem.slug === 'stale-version' && typeof latestId === 'string')
      this.#stale.set({ latestId, detail: problem.message });
    else this.#problem.set(problem);
  }

  async #read(peerGroupId: string | undefined, isOnNewestPanel: boolean): Promise<PeersView> {
    const [{ versions: panelVersions }, { versions }] = await Promise.all([
      firstValueFrom(this.#panels.versions()),
      firstValueFrom(this.#peers.list()),
    ]);
    if (panelVersions.length === 0) return { kind: 'no-panel' };
    const shownId = peerGroupId ?? versions[0]?.id;
    const saved = shownId === undefined ? null : await firstValueFrom(this.#peers.read(shownId));
    const panelVersionId =
      isOnNewestPanel || saved === null ? panelVersions[0].id : saved.panelVersionId;
    const { companies } = await firstValueFrom(this.#panels.companies(panelVersionId));
    const draft = startDraft(panelVersionId, companies, saved);
    const without = saved === null ? null : await this.#readWithout(saved.id);
    return { kind: 'ready', ground: { panelVersions, versions, saved, companies, without }, draft };
  }

  async #readWithout(peerGroupId: string): Promise<PeersGround['without']> {
    const { fit } = await firstValueFrom(this.#desk.read());
    if (fit?.peerGroupId !== peerGroupId) return null;
    const { result } = await firstValueFrom(this.#fits.read(fit.id));
    return result === null ? null : standingsWithout(result);
  }

  #change(change: (draft: PeerDraft) => PeerDraft): void {
    this.#view.update((view) =>
      view.kind === 'ready' ? { ...view, draft: change(view.draft) } : view,
    );
  }
}
