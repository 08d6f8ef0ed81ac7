import type { FitResult, PanelColumns } from '../../stats';

/** A row that went into a fit; amounts in the panel's measure, regressors of the year before where the fit lags them. */
export interface RowUsed {
  readonly company: string;
  readonly year: number;
  readonly outcome: number;
  readonly regressors: readonly number[];
  /** Line of the imported file, the header being line 1. */
  readonly fileRow: number;
  /** False for a company with this one row: it has an intercept, and no part in any other figure. */
  readonly isUsed: boolean;
}

/** The rows of the members with every value, by company and year, as the engine orders them. */
export function rowsUsed(
  columns: PanelColumns,
  result: Pick<FitResult, 'members' | 'sample' | 'specification'>,
): RowUsed[] {
  const members = new Set(result.members);
  const dropped = new Set(result.sample.dropped.map(({ row }) => row));
  const singles = new Set(result.sample.singleRow);
  const { lag } = result.specification;
  const places = new Map<string, number>();
  const nameOf = (row: number): string => columns.companies[columns.company[row]];
  const key = (company: string, year: number): string => JSON.stringify([company, year]);
  columns.company.forEach((_, row) => places.set(key(nameOf(row), columns.year[row]), row));
  const rows = Array.from(columns.company, (_, row) => row).filter(
    (row) => members.has(nameOf(row)) && !dropped.has(columns.fileRow[row]),
  );
  return rows
    .map((row): RowUsed => {
      const company = nameOf(row);
      const year = columns.year[row];
      const source = lag === 0 ? row : places.get(key(company, year - lag));
      return {
        company,
        year,
        outcome: columns.outcome.values[row],
        regressors: columns.regressors.map(({ values }) => values[source ?? -1]),
        fileRow: columns.fileRow[row],
        isUsed: !singles.has(company),
      };
    })
    .sort((left, right) => byCodeUnit(left.company, right.company) || left.year - right.year);
}

function byCodeUnit(left: string, right: string): number {
  if (left === right) return 0;
  return left < right ? -1 : 1;
}
