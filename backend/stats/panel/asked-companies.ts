import type { PanelColumns } from '../fit-result';
import { StatsError } from '../stats-error';

/** The companies that are asked for; arrays by company code. */
export interface AskedCompanies {
  /** Sorted, each once. */
  readonly names: readonly string[];
  /** 1 where the code's company is asked for. */
  readonly isAsked: Uint8Array;
  /** Place of the code in the order of names; codes of the same name share theirs. */
  readonly place: Int32Array;
}

/**
 * Everyone who is asked for, and the order of the companies by name.
 *
 * @param own  is added to the members; null where the fit has no own company.
 * @param members  names; undefined means every company with a row.
 * @throws {StatsError} 'unknown-company' for a name without a row.
 */
export function askedCompanies(
  { companies, company }: PanelColumns,
  own: string | null,
  members: readonly string[] | undefined,
): AskedCompanies {
  const wanted = new Set(members);
  if (own !== null) wanted.add(own);
  const missing = new Set(wanted);
  const isPresent = presentCodes(company, companies.length);
  const isAsked = new Uint8Array(companies.length);
  const place = new Int32Array(companies.length);
  const names: string[] = [];
  const order = codesByName(companies);
  for (let index = 0; index < order.length; index += 1) {
    const code = order[index];
    const name = companies[code];
    const isSame = index > 0 && companies[order[index - 1]] === name;
    place[code] = isSame ? place[order[index - 1]] : index;
    if (isPresent[code] === 0) continue;
    if (missing.size > 0) missing.delete(name);
    if (members !== undefined && !wanted.has(name)) continue;
    isAsked[code] = 1;
    if (names[names.length - 1] !== name) names.push(name);
  }
  refuseUnknown([...missing]);
  return { names, isAsked, place };
}

function presentCodes(company: Int32Array, count: number): Uint8Array {
  const isPresent = new Uint8Array(count);
  for (let row = 0; row < company.length; row += 1) isPresent[company[row]] = 1;
  return isPresent;
}

/** Codes in the order of their names, those of the same name in their own. */
function codesByName(companies: readonly string[]): Int32Array {
  const order = new Int32Array(companies.length);
  let isSorted = true;
  for (let code = 0; code < order.length; code += 1) {
    order[code] = code;
    if (code > 0 && companies[code - 1] > companies[code]) isSorted = false;
  }
  return isSorted
    ? order
    : order.sort((left, right) => byCodeUnit(companies[left], companies[right]) || left - right);
}

/** The same order on every machine, whatever its language. */
function byCodeUnit(left: string, right: string): number {
  if (left === right) return 0;
  return left < right ? -1 : 1;
}

function refuseUnknown(unknown: readonly string[]): void {
  if (unknown.length === 0) return;
  throw new StatsError(
    'unknown-company',
    `expected rows with a year in the panel for every company; found none for ${unknown.join(', ')}`,
    { companies: unknown },
  );
}
