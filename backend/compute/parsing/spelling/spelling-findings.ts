import { findingAt, type FindingList } from '../finding-list';
import type { PanelKeys } from '../read-keys';
import type { Table } from '../table';
import type { SimilarCompanies } from './similar-companies';

/** One finding a further spelling, at the first row that has it. */
export function findSpellings(
  table: Table,
  keys: PanelKeys,
  companyIndex: number,
  groups: readonly SimilarCompanies[],
  findings: FindingList,
): void {
  if (groups.length === 0) return;
  const firstRow = new Map<number, number>();
  keys.company.forEach((code, row) => {
    if (!firstRow.has(code)) firstRow.set(code, keys.tableRow[row]);
  });
  for (const { names, isSeenTogether } of groups) {
    const [{ code: likeliest }, ...others] = names;
    for (const { code } of others) {
      const detail = `May be the same company as “${keys.companies[likeliest]}”; both count as companies of their own until one is renamed.${isSeenTogether ? ' They have rows of the same year, which speaks against it.' : ''}`;
      const remark = { code: 'spelling', detail, isBlocking: false } as const;
      findings.add(findingAt(table, firstRow.get(code) ?? 0, companyIndex, remark));
    }
  }
}
