import { findingAt, type FindingList } from './finding-list';
import type { PanelKeys } from './read-keys';
import type { Table } from './table';

/** So many other lines are named; a key that stands in every row would else name each row in each. */
const mostLinesNamed = 20;

/** Finds every row whose company and year another row has too. */
export function findDuplicates(
  table: Table,
  keys: PanelKeys,
  yearIndex: number,
  findings: FindingList,
): void {
  for (const rows of rowsOfSameKey(keys)) {
    const isOneFiscalYear = rows.every((row) => keys.fiscalEnd[row] === keys.fiscalEnd[rows[0]]);
    for (const row of rows) {
      const others = rows.filter((other) => other !== row).slice(0, mostLinesNamed);
      const remark = isOneFiscalYear ? sameYear : otherFiscalYear;
      const finding = findingAt(table, keys.tableRow[row], yearIndex, {
        code: 'duplicate',
        detail: remark({
          company: keys.companies[keys.company[row]],
          year: keys.year[row],
          text: textOf(table, keys, yearIndex, row),
          others: others.map((other) => ({
            line: table.lines[keys.tableRow[other]],
            text: textOf(table, keys, yearIndex, other),
          })),
          isMore: rows.length - 1 > mostLinesNamed,
        }),
        isBlocking: true,
      });
      findings.add({
        ...finding,
        ...(isOneFiscalYear && { found: String(keys.year[row]) }),
        ...(row !== rows[0] && { sameAs: table.lines[keys.tableRow[rows[0]]] }),
      });
    }
  }
}

interface SharedYear {
  readonly company: string;
  readonly year: number;
  readonly text: string;
  readonly others: readonly { readonly line: number; readonly text: string }[];
  readonly isMore: boolean;
}

function sameYear({ company, year, others, isMore }: SharedYear): string {
  const lines = others.map(({ line }) => line).join(', ');
  return `${company} ${year} also stands on line ${lines}${isMore ? ' and more' : ''}.`;
}

/** Two fiscal years of a company in one calendar year, as after a change of its year-end. */
function otherFiscalYear({ company, year, text, others, isMore }: SharedYear): string {
  const lines = others.map((other) => `line ${other.line} (${other.text})`).join(', ');
  return `${company} has more than one fiscal year that counts as ${year}: ${text} here, and ${lines}${isMore ? ' and more' : ''}. Keep one of them.`;
}

function textOf(table: Table, keys: PanelKeys, yearIndex: number, row: number): string {
  return table.rows[keys.tableRow[row]][yearIndex].trim();
}

/** Rows that share company and year with another, in the order of the first of them. */
function rowsOfSameKey({ companies, company, year }: PanelKeys): readonly (readonly number[])[] {
  const ofCompany = rowsByCompany(companies.length, company);
  const firstRow = new Map<number, number>();
  const shared = new Map<number, number[]>();
  for (const row of ofCompany) {
    const first = firstRow.get(year[row]);
    // Rows of one company follow each other, so that a row of another is over.
    if (first === undefined || company[first] !== company[row]) {
      firstRow.set(year[row], row);
      continue;
    }
    const rows = shared.get(first) ?? [first];
    rows.push(row);
    shared.set(first, rows);
  }
  return [...shared.values()].sort(([left], [right]) => left - right);
}

/** Rows in the order of their companies, those of one company in their own order. */
function rowsByCompany(companies: number, company: Int32Array): Int32Array {
  const next = new Int32Array(companies + 1);
  for (const code of company) next[code + 1] += 1;
  for (let code = 0; code < companies; code++) next[code + 1] += next[code];
  const rows = new Int32Array(company.length);
  for (let row = 0; row < company.length; row++) {
    rows[next[company[row]]] = row;
    next[company[row]] += 1;
  }
  return rows;
}
