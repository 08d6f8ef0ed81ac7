import type { ImportChanges, ImportCheck, ImportMapping, ImportReply } from '@contract';
import { counted, listed } from '../../ui/phrases';
import { companiesAndYears } from '../panel-finding';

/** `7 findings, 2 keep the file from becoming a panel`. */
export function findingWords({ findingCount, blockingCount }: ImportCheck): string {
  if (findingCount === 0) return 'The check found nothing to mend';
  const all = counted(findingCount, 'finding');
  if (blockingCount === 0) return `${all}, none keeps the file out`;
  return `${all}, ${blockingCount.toLocaleString('en')} ${blockingCount === 1 ? 'keeps' : 'keep'} the file out`;
}

/** `14 companies, FY2008–FY2025: 246 rows, 241 of them complete`. */
export function countWords(check: ImportCheck): string {
  const rows = `${counted(check.rows, 'row')}, ${check.completeRows.toLocaleString('en')} of them complete`;
  if (check.firstYear === null || check.lastYear === null) return rows;
  const { companies, firstYear, lastYear } = check;
  return `${companiesAndYears({ companies, firstYear, lastYear })}: ${rows}`;
}

/** What of the file stays outside, and what of its formulas is not read. */
export function leftOutWords(check: ImportCheck): string {
  const { formulaCells } = check;
  const left = check.blockingCount === 0 ? leftOutOf(check) : keptOutOf(check);
  if (formulaCells === 0) return left;
  return `${left} ${counted(formulaCells, 'cell')} ${formulaCells === 1 ? 'holds a formula' : 'hold formulas'}: the value stored for ${formulaCells === 1 ? 'it' : 'them'} is taken.`;
}

function leftOutOf({ leftOutRows }: ImportCheck): string {
  if (leftOutRows === 0) return 'No row of the file is left out.';
  return `${counted(leftOutRows, 'row')} of the file ${leftOutRows === 1 ? 'is' : 'are'} left out: excluded, or without company or year.`;
}

/** Rows of the file in one sum, where findings keep all of them out. */
function keptOutOf({ rows, leftOutRows, blockingCount }: ImportCheck): string {
  const left =
    leftOutRows === 0
      ? ''
      : `, and ${leftOutRows.toLocaleString('en')} ${leftOutRows === 1 ? 'is' : 'are'} left out or ${leftOutRows === 1 ? 'has' : 'have'} no company or year that can be read`;
  const all = counted(rows + leftOutRows, 'row');
  return `Nothing comes in yet: ${counted(blockingCount, 'finding')} ${blockingCount === 1 ? 'keeps' : 'keep'} the file out. Of its ${all} ${rows.toLocaleString('en')} ${rows === 1 ? 'names' : 'name'} a company and a year${left}.`;
}

/** `Against version 3: 14 rows come, none goes, 2 cells change.` */
export function changeWords({
  number,
  addedRows,
  removedRows,
  changedCells,
}: ImportChanges): string {
  if (addedRows + removedRows + changedCells === 0)
    return `Nothing changes against version ${number}: it holds the same figures.`;
  return `Against version ${number}: ${listed([
    `${counted(addedRows, 'row')} ${addedRows === 1 ? 'comes' : 'come'}`,
    `${counted(removedRows, 'row')} ${removedRows === 1 ? 'goes' : 'go'}`,
    `${counted(changedCells, 'cell')} ${changedCells === 1 ? 'changes' : 'change'}`,
  ])}.`;
}

/** `money in EUR millions`, and at which prices where that was asked for. */
export function moneyWords({ currency, unit, conversion }: Partial<ImportMapping>): string {
  const prices = conversion?.prices;
  const real = prices ? ` at prices of ${prices.baseYear}` : '';
  return `money in ${currency ?? ''} ${unit ?? ''}${real}`;
}

/** The finding of the page about an import, by what is done with it. */
export function importFinding({ fileName, rowCount, state, check }: ImportReply): string {
  if (state === 'committing') return `${fileName}: its rows are being written`;
  if (state === 'failed') return `${fileName}: bringing it in did not work`;
  return check === null
    ? `${fileName}: ${counted(rowCount, 'row')}, not checked yet`
    : `${fileName}: ${findingWords(check)}`;
}
