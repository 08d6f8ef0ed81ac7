import type { ImportReply } from '@contract';
import { companiesAndYears } from '../panel-finding';
import { counted } from '../../ui/phrases';

export type ImportCheck = NonNullable<ImportReply['check']>;

/** `7 findings, 2 keep the file from becoming a panel`. */
export function findingWords({ findingCount, blockingCount }: ImportCheck): string {
  if (findingCount === 0) return 'The check found nothing to mend';
  const all = counted(findingCount, 'finding');
  if (blockingCount === 0) return `${all}, none keeps the file out`;
  return `${all}, ${blockingCount} ${blockingCount === 1 ? 'keeps' : 'keep'} the file out`;
}

/** `14 companies, FY2008–FY2025: 246 rows, 241 of them complete`. */
export function countWords(check: ImportCheck): string {
  const rows = `${counted(check.rows, 'row')}, ${check.completeRows.toLocaleString('en')} of them complete`;
  if (check.firstYear === null || check.lastYear === null) return rows;
  const { companies, firstYear, lastYear } = check;
  return `${companiesAndYears({ companies, firstYear, lastYear })}: ${rows}`;
}
