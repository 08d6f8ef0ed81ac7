import type { PanelColumns } from '../fit-result';
import { StatsError } from '../stats-error';

/**
 * Everyone who is asked for, sorted by name.
 *
 * @throws {StatsError} 'unknown-company' for a name without a row.
 */
export function memberNames(
  data: PanelColumns,
  own: string | null,
  members: readonly string[] | undefined,
): string[] {
  const isPresent = new Uint8Array(data.companies.length);
  for (let row = 0; row < data.company.length; row += 1) isPresent[data.company[row]] = 1;
  const present = new Set(data.companies.filter((_, code) => isPresent[code] === 1));
  const names = new Set(members ?? present);
  if (own !== null) names.add(own);
  const unknown = [...names].filter((name) => !present.has(name));
  if (unknown.length > 0) {
    throw new StatsError(
      'unknown-company',
      `expected rows with a year in the panel for every company; found none for ${unknown.join(', ')}`,
      { companies: unknown },
    );
  }
  return [...names].sort(byCodeUnit);
}

/** Rows of the members by company name, year and line of the file; those of a sorted panel are only picked. */
export function sortedRows(data: PanelColumns, members: readonly string[]): Int32Array {
  const place = companyPlaces(data);
  const wanted = new Set(members);
  const isMember = data.companies.map((name) => wanted.has(name));
  const rows = new Int32Array(data.company.length);
  let count = 0;
  for (let row = 0; row < rows.length; row += 1) {
    if (isMember[data.company[row]]) rows[count++] = row;
  }
  const picked = rows.slice(0, count);
  const order = (left: number, right: number): number =>
    place[data.company[left]] - place[data.company[right]] ||
    data.year[left] - data.year[right] ||
    data.fileRow[left] - data.fileRow[right];
  let isSorted = true;
  for (let index = 1; isSorted && index < count; index += 1) {
    const before = picked[index - 1];
    const row = picked[index];
    isSorted =
      data.company[before] === data.company[row]
        ? data.year[before] < data.year[row]
        : order(before, row) < 0;
  }
  return isSorted ? picked : picked.sort(order);
}

/** Place of each company code in the order of names; codes of the same name share theirs. */
function companyPlaces(data: PanelColumns): Int32Array {
  const { companies } = data;
  const order = Int32Array.from(companies, (_, code) => code);
  if (companies.some((name, code) => code > 0 && companies[code - 1] > name)) {
    order.sort((left, right) => byCodeUnit(companies[left], companies[right]) || left - right);
  }
  const place = new Int32Array(companies.length);
  order.forEach((code, index) => {
    const isSame = index > 0 && companies[order[index - 1]] === companies[code];
    place[code] = isSame ? place[order[index - 1]] : index;
  });
  return place;
}

/** The same order on every machine, whatever its language. */
function byCodeUnit(left: string, right: string): number {
  if (left === right) return 0;
  return left < right ? -1 : 1;
}
