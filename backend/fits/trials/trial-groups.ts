import type { StoredSpecification } from '../fit-view';

/** Of the members, the first so many are left out in turn. */
export const mostLeftOut = 60;

/** What is to be tried out, as it is stored. */
export interface TrialRequest {
  readonly panelVersionId: string;
  readonly ownCompany: string;
  /** Who is in, the nearest first. */
  readonly peers: readonly string[];
  /** Who might come in. */
  readonly candidates: readonly string[];
  readonly specification: StoredSpecification;
}

/** One group to be fitted: as chosen, without a company, or with one more. */
export type TrialGroup =
  { readonly kind: 'chosen' } | { readonly kind: 'without' | 'taking'; readonly company: string };

/** In the order in which they are fitted, and in which their outcomes are kept. */
export function groupsOf({ peers, candidates }: TrialRequest): readonly TrialGroup[] {
  return [
    { kind: 'chosen' },
    ...peers.slice(0, mostLeftOut).map((company): TrialGroup => ({ kind: 'without', company })),
    ...candidates.map((company): TrialGroup => ({ kind: 'taking', company })),
  ];
}

/** The own company first, as in a saved group. */
export function membersOf(
  { ownCompany, peers }: TrialRequest,
  group: TrialGroup,
): readonly string[] {
  const all = [ownCompany, ...peers];
  switch (group.kind) {
    case 'chosen':
      return all;
    case 'without':
      return all.filter((company) => company !== group.company);
    case 'taking':
      return [...all, group.company];
  }
}
