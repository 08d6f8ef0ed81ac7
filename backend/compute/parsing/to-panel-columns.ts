import type { PanelColumns } from '../../stats';
import { FindingList } from './finding-list';
import { readPanel } from './read-panel';
import { plainTerms } from './reading-terms';
import type { Table } from './table';
import type { TableFinding } from './table-finding';

/** Which column of the file is what to a fit, by header. */
export interface FitMapping {
  readonly company: string;
  readonly year: string;
  readonly outcome: string;
  readonly regressors: readonly string[];
}

/** Columns for a fit, and everything to say about their cells. */
export interface PanelColumnsReading {
  readonly data: PanelColumns;
  /** All places that make the columns unusable: text in a number, a year that is none, a row twice. */
  readonly problems: readonly TableFinding[];
  /** Rows without company or year; they are in no column. */
  readonly leftOut: readonly TableFinding[];
}

/** @throws {TableError} 'missing-column' or 'ambiguous-column' with the headers concerned. */
export function toPanelColumns(table: Table, mapping: FitMapping): PanelColumnsReading {
  const numbers = [mapping.outcome, ...mapping.regressors];
  const list = new FindingList();
  const reading = readPanel(table, { ...mapping, numbers }, plainTerms, list);
  const findings = list.first();
  const [outcome, ...regressors] = reading.numbers;
  const keys = new Set([mapping.company, mapping.year]);
  return {
    data: {
      companies: reading.companies,
      company: reading.company,
      year: reading.year,
      fileRow: reading.fileRow,
      outcome,
      regressors,
    },
    problems: findings.filter(({ isBlocking }) => isBlocking),
    leftOut: findings.filter(
      ({ code, column }) => code === 'no-company' || (code === 'missing' && keys.has(column)),
    ),
  };
}
