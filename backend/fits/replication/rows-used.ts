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

/**
 * The rows of the members with every value, by company and year, as the engine orders them. In time of the rows: names
 * are compared once a company.
 */
export function* rowsUsed(
  columns: PanelColumns,
  {
    members,
    sample,
    specification,
  }: Pick<FitResult, 'members' | 'specification'> & {
    readonly sample: Pick<FitResult['sample'], 'singleRow'>;
  },
): Generator<RowUsed> {
  const singles = new Set(sample.singleRow);
  const { lag } = specification;
  const rowsOf = columns.companies.map((): number[] => []);
  columns.company.forEach((code, row) => rowsOf[code].push(row));
  const codes = new Map(columns.companies.map((name, code) => [name, code]));
  const names = [...new Set(members)].sort(byCodeUnit);
  for (const company of names) {
    const rows = (rowsOf[codes.get(company) ?? -1] ?? []).sort(
      (left, right) => columns.year[left] - columns.year[right],
    );
    const ofYear = new Map(rows.map((row) => [columns.year[row], row]));
    for (const row of rows) {
      const year = columns.year[row];
      const source = ofYear.get(year - lag);
      const values = [
        columns.outcome.values[row],
        ...columns.regressors.map((regressor) => regressor.values[source ?? -1] ?? NaN),
      ];
      // Lines of the file do not tell rows apart: one line can hold several years, and typed rows have none.
      if (values.some(Number.isNaN)) continue;
      const [outcome, ...regressors] = values;
      yield {
        company,
        year,
        outcome,
        regressors,
        fileRow: columns.fileRow[row],
        isUsed: !singles.has(company),
      };
    }
  }
}

function byCodeUnit(left: string, right: string): number {
  if (left === right) return 0;
  return left < right ? -1 : 1;
}
