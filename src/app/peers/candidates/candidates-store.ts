import { Injectable, computed, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router } from '@angular/router';
import type { PanelCompany } from '../peer-draft';
import { NearnessStore } from '../nearness/nearness-store';
import { nearestFirst } from '../nearness/peer-nearness-of';
import { PeersStore } from '../peers-store';
import {
  type CandidateFilters,
  attributeFacets,
  hasName,
  isAskedFor,
  noFilters,
} from './candidate-filters';
import { filtersFrom, paramsOf } from './filters-in-address';

export type MemberOrder = 'name' | 'nearness';

/** Members and candidates as they are listed: filtered by what the address says, nearest first. */
@Injectable()
export class CandidatesStore {
  readonly #peers = inject(PeersStore);
  readonly #nearness = inject(NearnessStore);
  readonly #router = inject(Router);
  readonly #route = inject(ActivatedRoute);
  readonly #filters = signal<CandidateFilters>(noFilters);
  readonly #memberOrder = signal<MemberOrder>('nearness');
  readonly #hasAll = signal(false);

  readonly #sides = computed(() => {
    const view = this.#peers.view();
    if (view.kind !== 'ready') return { inside: [], outside: [] };
    const { choices, ownCompany } = view.draft;
    const others = view.ground.companies.filter(({ name }) => name !== ownCompany);
    const isInside = ({ name }: PanelCompany) => choices.get(name)?.isIncluded ?? false;
    return {
      inside: others.filter(isInside),
      outside: others.filter((company) => !isInside(company)),
    };
  });

  readonly filters = this.#filters.asReadonly();
  readonly memberOrder = this.#memberOrder.asReadonly();
  /** Whether more than the nearest candidates are listed. */
  readonly hasAll = this.#hasAll.asReadonly();
  /** The attributes of the candidates, with counts. */
  readonly facets = computed(() => attributeFacets(this.#sides().outside));
  /** Members whose name is asked for, in the order chosen. */
  readonly members = computed(() => {
    const found = this.#sides().inside.filter((each) => hasName(each, this.#filters().name));
    return this.#memberOrder() === 'nearness'
      ? nearestFirst(found, this.#nearness.nearness())
      : found.sort((a, b) => a.name.localeCompare(b.name, 'en'));
  });
  /** Candidates that are asked for, nearest first. */
  readonly candidates = computed(() =>
    nearestFirst(
      this.#sides().outside.filter((company) => isAskedFor(company, this.#filters())),
      this.#nearness.nearness(),
    ),
  );
  readonly memberCount = computed(() => this.#sides().inside.length);
  readonly candidateCount = computed(() => this.#sides().outside.length);

  constructor() {
    this.#route.queryParamMap.pipe(takeUntilDestroyed()).subscribe((address) => {
      this.#filters.set(filtersFrom(address));
    });
  }

  listAll(): void {
    this.#hasAll.set(true);
  }

  orderMembers(by: MemberOrder): void {
    this.#memberOrder.set(by);
  }

  /** Shows other candidates, and writes them into the address, so that its link shows the same. */
  filter(change: Partial<CandidateFilters>): void {
    const before = this.#filters();
    const filters = { ...before, ...change };
    this.#filters.set(filters);
    void this.#router.navigate([], {
      relativeTo: this.#route,
      queryParams: paramsOf(filters, before),
      queryParamsHandling: 'merge',
      replaceUrl: true,
      scroll: 'manual',
    });
  }

  showAll(): void {
    this.filter(noFilters);
  }
}
