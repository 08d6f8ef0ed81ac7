import { findingAt, type FindingList } from '../finding-list';
import type { PanelKeys } from '../read-keys';
import type { Table } from '../table';
import type { SimilarCompanies, SimilarName } from './similar-companies';

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
    const [likeliest, ...others] = names;
    for (const { code } of others) {
      if (code === null) continue;
      const detail = `${sameCompany(likeliest)}${isSeenTogether ? ' They have rows of the same year, which speaks against it.' : ''}`;
      const remark = { code: 'spelling', detail, isBlocking: false } as const;
      findings.add(findingAt(table, firstRow.get(code) ?? 0, companyIndex, remark));
    }
  }
}

function sameCompany({ company, code }: SimilarName): string {
  return code === null
    ? `May be the same company as “${company}” of the panel’s newest version; comes in as a company of its own until it is renamed.`
    : `May be the same company as “${company}”; both count as companies of their own until one is renamed.`;
}
