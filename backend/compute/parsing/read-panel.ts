import type { NamedColumn } from '../../stats';
import { columnIndices, type TableMapping } from './column-indices';
import { FindingList } from './finding-list';
import { findDuplicates } from './key-findings';
import { type PanelKeys, readKeys } from './read-keys';
import { readNumbers } from './read-numbers';
import { plainTerms, type ReadingTerms } from './reading-terms';
import type { Table } from './table';

/** The rows of a table that name a company and a year, read as numbers; NaN stands for a missing cell or a text. */
export interface PanelReading extends PanelKeys {
  /** Line of the file that each row begins on. */
  readonly fileRow: Int32Array;
  readonly numbers: readonly NamedColumn[];
}

/**
 * Reads the mapped columns of a table.
 *
 * @param findings  is told of every cell that is missing, cannot be read or can be read two ways, and of every row that
 * stands there twice.
 * @throws {TableError} 'missing-column' or 'ambiguous-column' with the headers concerned.
 */
export function readPanel(
  table: Table,
  mapping: TableMapping,
  terms: ReadingTerms = plainTerms,
  findings: FindingList = new FindingList(),
): PanelReading {
  const indices = columnIndices(table, mapping);
  const keys = readKeys(table, indices, terms, findings);
  const numbers = readNumbers(table, keys.tableRow, indices.numberIndices, terms, findings);
  findDuplicates(table, keys, indices.yearIndex, findings);
  return { ...keys, fileRow: keys.tableRow.map((row) => table.lines[row]), numbers };
}
