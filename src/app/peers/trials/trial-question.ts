import type { FitSummary, StartPeerTrial } from '@contract';
import type * as z from 'zod';
import type { PanelCompany } from '../peer-draft';

export type TrialQuestion = z.input<typeof StartPeerTrial>;
/** Whose group is tried, without how it is fitted. */
export type TriedGroup = Pick<
  TrialQuestion,
  'panelVersionId' | 'ownCompany' | 'peers' | 'candidates'
>;

/** As many candidates as a trial takes. */
export const nearestTried = 20;

/**
 * The specification of the newest fit, the usual one where there is none: further columns that this panel has no more
 * are left out, draws of a bootstrap start from the usual seed.
 */
export function specificationLike(
  fit: FitSummary | null,
  companies: readonly PanelCompany[],
): TrialQuestion['specification'] {
  if (fit === null) return {};
  const { effects, form, lag, slopes, confidence, regressors } = fit;
  const columns = new Set(companies.flatMap(({ measures }) => Object.keys(measures.others)));
  const furtherRegressors = regressors.slice(2).filter((name) => columns.has(name));
  return { effects, form, lag, slopes, confidence, furtherRegressors };
}

export function isSameGroup(a: TriedGroup, b: TriedGroup): boolean {
  if (a.panelVersionId !== b.panelVersionId || a.ownCompany !== b.ownCompany) return false;
  return hasSameNames(a.peers, b.peers);
}

export function hasSameNames(a: readonly string[], b: readonly string[]): boolean {
  const names = new Set(a);
  return names.size === b.length && b.every((name) => names.has(name));
}
