import type { PanelDifferencesReply } from '@contract';
import { counted, listed } from '../../ui/phrases';

/** What a newer panel says otherwise of one company. */
export interface CompanyChange {
  readonly company: string;
  /** `3 cells changed, 1 year added`. */
  readonly words: string;
}

/**
 * What changed of the companies given, by company, those with the most changes first.
 *
 * @returns `isWhole` is false where the server lists only a part of the differences.
 */
export function companyChanges(
  differences: PanelDifferencesReply,
  companies: readonly string[],
): { readonly changes: readonly CompanyChange[]; readonly isWhole: boolean } {
  const chosen = new Set(companies);
  const counts = new Map<string, { changed: number; added: number; removed: number }>();
  for (const { company, kind } of differences.listed) {
    if (!chosen.has(company)) continue;
    const count = counts.get(company) ?? { changed: 0, added: 0, removed: 0 };
    if (kind === 'changed-cell') count.changed++;
    else if (kind === 'added-row') count.added++;
    else count.removed++;
    counts.set(company, count);
  }
  const changes = [...counts]
    .map(([company, { changed, added, removed }]) => ({
      company,
      total: changed + added + removed,
      words: listed([
        ...(changed === 0 ? [] : [`${counted(changed, 'cell')} changed`]),
        ...(added === 0 ? [] : [`${counted(added, 'year')} added`]),
        ...(removed === 0 ? [] : [`${counted(removed, 'year')} removed`]),
      ]),
    }))
    .sort((a, b) => b.total - a.total || a.company.localeCompare(b.company, 'en'))
    .map(({ company, words }) => ({ company, words }));
  const all = differences.changedCells + differences.addedRows + differences.removedRows;
  return { changes, isWhole: differences.listed.length >= all };
}
