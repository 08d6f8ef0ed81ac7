import type { PanelRows, PanelVersionRow } from '../../db/repositories/panels-repository';
import type { PanelColumns } from '../stats';
import type { StoredSpecification } from './fit-view';

/** The panel's rows as the engine takes them: typed columns, NaN for a missing cell. */
export function toPanelColumns(
  version: PanelVersionRow,
  rows: PanelRows,
  specification: StoredSpecification,
): PanelColumns {
  const companies = [...new Set(rows.company)];
  const codes = new Map(companies.map((name, code) => [name, code]));
  const columnValues = (name: string): Float64Array => {
    const column = version.columns.findIndex((candidate) => candidate.name === name);
    return Float64Array.from(rows.cells, (cells) => cells[column] ?? Number.NaN);
  };
  return {
    companies,
    company: Int32Array.from(rows.company, (name) => codes.get(name) ?? 0),
    year: Int32Array.from(rows.year),
    fileRow: Int32Array.from(rows.fileRow),
    outcome: { name: specification.outcome, values: columnValues(specification.outcome) },
    regressors: specification.regressors.map((name) => ({ name, values: columnValues(name) })),
  };
}
