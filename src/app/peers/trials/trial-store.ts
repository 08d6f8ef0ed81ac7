import { Injectable, computed, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import type { PeerTrialReply } from '@contract';
import { type Observable, Subject, catchError, firstValueFrom, map, of, switchMap } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../../api/api-problem';
import { DeskApi } from '../../api/desk-api';
import { PeerTrialsApi } from '../../api/peer-trials-api';
import { SessionStore } from '../../api/session-store';
import { CandidatesStore } from '../candidates/candidates-store';
import { NearnessStore } from '../nearness/nearness-store';
import { nearestFirst } from '../nearness/peer-nearness-of';
import { PeersStore } from '../peers-store';
import { KeptTrial } from './kept-trial';
import {
  type TrialQuestion,
  type TriedGroup,
  hasSameNames,
  isSameGroup,
  nearestTried,
  specificationLike,
} from './trial-question';

type TrialView =
  | { readonly kind: 'idle' }
  | { readonly kind: 'starting' }
  | { readonly kind: 'shown'; readonly trial: PeerTrialReply }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** What each choice by one company would change of the group on the page, computed on the server when it is asked for. */
@Injectable()
export class TrialStore {
  readonly #trials = inject(PeerTrialsApi);
  readonly #desk = inject(DeskApi);
  readonly #peers = inject(PeersStore);
  readonly #candidates = inject(CandidatesStore);
  readonly #nearness = inject(NearnessStore);
  readonly #kept = inject(KeptTrial);
  readonly #workspaceId = inject(SessionStore).workspace()?.id ?? '';
  readonly #view = signal<TrialView>({ kind: 'idle' });
  readonly #cancelProblem = signal<ApiProblem | null>(null);
  readonly #runs = new Subject<Observable<TrialView>>();

  /** Why it could not be computed. */
  readonly problem = computed(() => {
    const view = this.#view();
    return view.kind === 'failed' ? view.problem : null;
  });
  readonly cancelProblem = this.#cancelProblem.asReadonly();
  /** The group on the page; null before it has an own company and a peer. */
  readonly group = computed((): TriedGroup | null => {
    const view = this.#peers.view();
    if (view.kind !== 'ready') return null;
    const { ownCompany, panelVersionId, choices } = view.draft;
    const inside = view.ground.companies.filter(
      ({ name }) => name !== ownCompany && choices.get(name)?.isIncluded === true,
    );
    if (ownCompany === '' || inside.length === 0) return null;
    const peers = nearestFirst(inside, this.#nearness.nearness()).map(({ name }) => name);
    const candidates = this.#candidates.candidates().slice(0, nearestTried);
    return { panelVersionId, ownCompany, peers, candidates: candidates.map(({ name }) => name) };
  });
  /** What is shown; figures of another panel version may be in another unit, so that they are not. */
  readonly trial = computed((): PeerTrialReply | null => {
    const [view, peers] = [this.#view(), this.#peers.view()];
    if (view.kind !== 'shown' || peers.kind !== 'ready') return null;
    const isOfPanel = view.trial.asked.panelVersionId === peers.draft.panelVersionId;
    return isOfPanel ? view.trial : null;
  });
  readonly isUnderWay = computed(() => {
    const state = this.trial()?.state;
    return this.#view().kind === 'starting' || state === 'queued' || state === 'running';
  });
  /** `choice`: the group on the page is another one now; `nearest`: others are the nearest candidates. */
  readonly overtakenBy = computed((): 'choice' | 'nearest' | null => {
    const [trial, group] = [this.trial(), this.group()];
    if (trial === null) return null;
    if (group === null || !isSameGroup(trial.asked, group)) return 'choice';
    return hasSameNames(trial.asked.candidates, group.candidates) ? null : 'nearest';
  });

  constructor() {
    this.#runs
      .pipe(
        switchMap((run) => run),
        takeUntilDestroyed(),
      )
      .subscribe((view) => {
        this.#view.set(view);
        if (view.kind === 'shown') this.#kept.keep(this.#workspaceId, view.trial.id);
      });
    const keptId = this.#kept.recall(this.#workspaceId);
    if (keptId !== null) this.#runs.next(this.#recalled(keptId));
  }

  /** Computes it for the group on the page, by the specification of the newest fit. */
  async start(): Promise<void> {
    const group = this.group();
    if (group === null || this.isUnderWay()) return;
    this.#cancelProblem.set(null);
    this.#view.set({ kind: 'starting' });
    try {
      const question = await this.#question(group);
      this.#runs.next(this.#trials.run(question).pipe(map(toShown), catchError(toFailed)));
    } catch (error) {
      this.#view.set({ kind: 'failed', problem: toApiProblem(error) });
    }
  }

  /** Stops it; what came until then stays. */
  async cancel(): Promise<void> {
    const trial = this.trial();
    if (trial === null) return;
    this.#cancelProblem.set(null);
    try {
      await firstValueFrom(this.#trials.cancel(trial.id), { defaultValue: undefined });
    } catch (error) {
      const problem = toApiProblem(error);
      // It ended in the same moment: the next look shows how.
      if (problem.slug !== 'conflict') this.#cancelProblem.set(problem);
    }
  }

  async #question(group: TriedGroup): Promise<TrialQuestion> {
    const companies = this.#peers.companies();
    const { fit } = await firstValueFrom(this.#desk.read());
    return { ...group, specification: specificationLike(fit, companies) };
  }

  /** One that is not there any more is forgotten: nobody asked for it now. */
  #recalled(trialId: string): Observable<TrialView> {
    return this.#trials.follow(trialId).pipe(
      map(toShown),
      catchError((error: unknown) => {
        const problem = toApiProblem(error);
        if (problem.slug !== 'not-found') return of<TrialView>({ kind: 'failed', problem });
        this.#kept.forget(this.#workspaceId);
        return of<TrialView>({ kind: 'idle' });
      }),
    );
  }
}

function toShown(trial: PeerTrialReply): TrialView {
  return { kind: 'shown', trial };
}

function toFailed(error: unknown): Observable<TrialView> {
  return of<TrialView>({ kind: 'failed', problem: toApiProblem(error) });
}
