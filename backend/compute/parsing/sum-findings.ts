import { type CellRemark, findingAt, type FindingList } from './finding-list';
import type { PanelKeys } from './read-keys';
import { isSumName } from './sum-names';
import type { Table } from './table';

/** Finds every row whose company has the name of a sum or a mean. */
export function findSums(
  table: Table,
  { companies, company, tableRow }: PanelKeys,
  companyIndex: number,
  findings: FindingList,
): void {
  const isSum = companies.map(isSumName);
  if (!isSum.includes(true)) return;
  company.forEach((code, row) => {
    if (isSum[code]) findings.add(findingAt(table, tableRow[row], companyIndex, sumOrCompany));
  });
}

const sumOrCompany: CellRemark = {
  code: 'sum',
  detail: 'A company, or a sum of others? It comes in as a company unless the line is left out.',
  isBlocking: false,
};
