import type { PanelColumns } from '../fit-result';
import { type RowPlace, StatsError } from '../stats-error';
import type { AskedCompanies } from './asked-companies';

/**
 * Rows of the companies that are asked for, by name, year and line of the file; those of a sorted panel are only picked.
 *
 * @throws {StatsError} 'duplicate-rows' with every row that shares company and year with another.
 */
export function sortedRows(data: PanelColumns, { isAsked, place }: AskedCompanies): Int32Array {
  const { company, year, fileRow } = data;
  const picked = new Int32Array(company.length);
  let count = 0;
  let isAscending = true;
  let placeBefore = -1;
  let yearBefore = 0;
  for (let row = 0; row < company.length; row += 1) {
    const code = company[row];
    if (isAsked[code] === 0) continue;
    const own = place[code];
    if (own < placeBefore || (own === placeBefore && year[row] <= yearBefore)) isAscending = false;
    placeBefore = own;
    yearBefore = year[row];
    picked[count++] = row;
  }
  const rows = count === picked.length ? picked : picked.slice(0, count);
  // Ascending without a tie: sorted, and no row shares company and year with another.
  if (isAscending) return rows;
  rows.sort(
    (left, right) =>
      place[company[left]] - place[company[right]] ||
      year[left] - year[right] ||
      fileRow[left] - fileRow[right],
  );
  refuseDuplicates(data, place, rows);
  return rows;
}

/** @param rows  sorted by company and year. */
function refuseDuplicates(data: PanelColumns, place: Int32Array, rows: Int32Array): void {
  const { company, year } = data;
  const shared = new Set<number>();
  for (let index = 1; index < rows.length; index += 1) {
    const before = rows[index - 1];
    const row = rows[index];
    if (year[before] === year[row] && place[company[before]] === place[company[row]]) {
      shared.add(before).add(row);
    }
  }
  if (shared.size === 0) return;
  const list = [...shared].map((row): RowPlace => ({
    row: data.fileRow[row],
    company: data.companies[company[row]],
    year: year[row],
  }));
  throw new StatsError(
    'duplicate-rows',
    `expected one row a company and year; found ${list.length} rows that share theirs with another`,
    { rows: list, companies: [...new Set(list.flatMap(({ company: name }) => name ?? []))] },
  );
}
