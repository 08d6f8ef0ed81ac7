import type { TableMapping } from './column-indices';
import { readPanel } from './read-panel';
import type { Table } from './table';
import type { TableFinding } from './table-finding';

/** What a panel made of the table would hold, and what stands in its way. */
export interface TableCheck {
  readonly companies: number;
  readonly years: number;
  readonly firstYear: number | null;
  readonly lastYear: number | null;
  /** Rows that name a company and a year. */
  readonly rows: number;
  /** Rows that also have every number. */
  readonly completeRows: number;
  /** At most `mostFindings`, blocking ones first; the counts are over all. */
  readonly findings: readonly TableFinding[];
  readonly findingCount: number;
  readonly blockingCount: number;
}

/** Checks a table row by row. */
export function checkTable(table: Table, mapping: TableMapping, mostFindings = 500): TableCheck {
  const reading = readPanel(table, mapping);
  const years = [...new Set(reading.year)].sort((left, right) => left - right);
  const blocking = reading.findings.filter(({ isBlocking }) => isBlocking);
  const others = reading.findings.filter(({ isBlocking }) => !isBlocking);
  let completeRows = 0;
  reading.year.forEach((_, row) => {
    if (reading.numbers.every(({ values }) => !Number.isNaN(values[row]))) completeRows += 1;
  });
  return {
    companies: reading.companies.length,
    years: years.length,
    firstYear: years[0] ?? null,
    lastYear: years[years.length - 1] ?? null,
    rows: reading.year.length,
    completeRows,
    findings: [...blocking, ...others].slice(0, mostFindings),
    findingCount: reading.findings.length,
    blockingCount: blocking.length,
  };
}
