import { wordsWidth } from './text-width';

/** A row of the panel, by what it lacks. A company and year without a row lack everything. */
export interface CoverageCell {
  readonly company: string;
  readonly year: number;
  /** Names of the variables without a value. */
  readonly missing: readonly string[];
  /** Names of the variables with a value that someone should look at, and of what else is so in the row. */
  readonly flagged?: readonly string[];
}

export interface CoverageData {
  readonly cells: readonly CoverageCell[];
  /** Every variable that is wanted. */
  readonly variables: readonly string[];
  /** Only this variable counts; null counts all. */
  readonly variable: string | null;
  readonly ownCompany: string | null;
}

export type CoverageState = 'complete' | 'some' | 'none';

/** What a company has in a year. */
export interface CoverageEntry {
  readonly year: number;
  readonly state: CoverageState;
  readonly missing: readonly string[];
  readonly flagged: readonly string[];
}

/** Company years by what they have; one with something flagged is counted there, too. */
export type CoverageCounts = Readonly<Record<CoverageState | 'flagged', number>>;

/** Every company in every year of the whole span; what a company has is made out only when it is asked for. */
export interface CoverageTable {
  /** Own company first, the others in the order of the alphabet. */
  readonly companies: readonly string[];
  readonly ownCompany: string | null;
  /** About how wide the longest name is, CSS pixels. */
  readonly longestName: number;
  readonly years: readonly number[];
  readonly counts: CoverageCounts;
  /** One entry a year, of the company at this place. */
  readonly entriesOf: (place: number) => readonly CoverageEntry[];
}

/** Of the names, CSS pixels. */
export const nameSize = 13;

/** Cost: one look at each cell and one sorting of the companies, whatever is drawn of them. */
export function coverageTable(data: CoverageData): CoverageTable {
  const byCompany = new Map<string, Map<number, CoverageCell>>();
  let [first, last] = [Infinity, -Infinity];
  for (const cell of data.cells) {
    const ofYear = byCompany.get(cell.company);
    if (ofYear === undefined) byCompany.set(cell.company, new Map([[cell.year, cell]]));
    else ofYear.set(cell.year, cell);
    first = Math.min(first, cell.year);
    last = Math.max(last, cell.year);
  }
  const years =
    byCompany.size === 0 ? [] : Array.from({ length: last - first + 1 }, (_, k) => first + k);
  const companies = inOrder([...byCompany.keys()], data.ownCompany);
  const wanted =
    data.variable === null
      ? data.variables
      : data.variables.filter((variable) => variable === data.variable);
  const entry = (cell: CoverageCell | undefined, year: number): CoverageEntry => {
    const missing = missingOf(cell, wanted);
    const flagged = flaggedOf(cell, data.variable);
    return { year, state: stateOf(missing.length, wanted.length), missing, flagged };
  };

  const counts = { complete: 0, some: 0, none: 0, flagged: 0 };
  for (const ofYear of byCompany.values()) {
    counts[stateOf(wanted.length, wanted.length)] += years.length - ofYear.size;
    for (const cell of ofYear.values()) {
      counts[stateOf(missingOf(cell, wanted).length, wanted.length)] += 1;
      if (flaggedOf(cell, data.variable).length > 0) counts.flagged += 1;
    }
  }
  return {
    companies,
    ownCompany: data.ownCompany,
    longestName: companies.reduce((most, name) => Math.max(most, wordsWidth(name, nameSize)), 0),
    years,
    counts,
    entriesOf: (place) => {
      const ofYear = byCompany.get(companies[place]);
      return years.map((year) => entry(ofYear?.get(year), year));
    },
  };
}

function inOrder(companies: string[], own: string | null): readonly string[] {
  // One collator for all: asked name by name, a panel of thousands takes long to sort.
  const { compare } = new Intl.Collator('en');
  return companies.sort((a, b) => Number(b === own) - Number(a === own) || compare(a, b));
}

function missingOf(cell: CoverageCell | undefined, wanted: readonly string[]): readonly string[] {
  if (cell === undefined) return wanted;
  return cell.missing.length === 0 ? [] : wanted.filter((name) => cell.missing.includes(name));
}

function stateOf(missing: number, wanted: number): CoverageState {
  if (missing === 0) return 'complete';
  return missing >= wanted ? 'none' : 'some';
}

/** What is flagged that counts: of one variable alone where one is looked at. */
function flaggedOf(cell: CoverageCell | undefined, variable: string | null): readonly string[] {
  const flagged = cell?.flagged ?? [];
  return variable === null ? flagged : flagged.filter((name) => name === variable);
}
