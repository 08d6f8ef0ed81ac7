import { rowsByCompany } from '../company-rows';
import type { ModelRole } from '../model-role';
import type { PanelCells } from '../panel-cells';

/** What a company is compared by; null where its cells do not say. */
export interface CompanyMeasures {
  readonly company: string;
  /** Natural log of the last positive market value. */
  readonly logMarketValue: number | null;
  /** Natural log of the last positive book equity. */
  readonly logBookEquity: number | null;
  /** Sum of capital expenditure over the sum of book equity, over the years that have both and positive book equity. */
  readonly capexToBookEquity: number | null;
  /** Mean log change of market value a year, from its first to its last positive value. */
  readonly growth: number | null;
  /** Standard deviation of the log changes of market value between consecutive years; of 3 changes at least. */
  readonly volatility: number | null;
  /** Last value of each further column, by header. */
  readonly others: Readonly<Record<string, number | null>>;
}

const fewestChanges = 3;

/** The measures of every company, in the order of `panel.companies`. Definitions of ours; common practice, no source. */
export function companyMeasures(panel: PanelCells): readonly CompanyMeasures[] {
  const cellsOf = (role: ModelRole): ArrayLike<number> | undefined => {
    const column = panel.columns.findIndex((candidate) => candidate.role === role);
    return column === -1 ? undefined : panel.values[column];
  };
  const [marketValue, capex, bookEquity] = [
    cellsOf('marketValue'),
    cellsOf('capex'),
    cellsOf('bookEquity'),
  ];
  const others = panel.columns.flatMap(({ name, role }, column) =>
    role === 'other' ? [{ name, cells: panel.values[column] }] : [],
  );
  return rowsByCompany(panel).map((rows, code) => ({
    company: panel.companies[code],
    logMarketValue: logOfLast(rows, marketValue),
    logBookEquity: logOfLast(rows, bookEquity),
    capexToBookEquity: ratioOfSums(rows, capex, bookEquity),
    ...growthAndVolatility(rows, panel.year, marketValue),
    others: Object.fromEntries(others.map(({ name, cells }) => [name, last(rows, cells)])),
  }));
}

function last(
  rows: Int32Array,
  cells: ArrayLike<number>,
  counts: (value: number) => boolean = Number.isFinite,
): number | null {
  for (let place = rows.length - 1; place >= 0; place--)
    if (counts(cells[rows[place]])) return cells[rows[place]];
  return null;
}

function logOfLast(rows: Int32Array, cells: ArrayLike<number> | undefined): number | null {
  const value = cells === undefined ? null : last(rows, cells, (candidate) => candidate > 0);
  return value === null ? null : Math.log(value);
}

function ratioOfSums(
  rows: Int32Array,
  above: ArrayLike<number> | undefined,
  below: ArrayLike<number> | undefined,
): number | null {
  if (above === undefined || below === undefined) return null;
  let [top, bottom] = [0, 0];
  for (const row of rows) {
    if (Number.isNaN(above[row]) || !(below[row] > 0)) continue;
    top += above[row];
    bottom += below[row];
  }
  return bottom > 0 ? top / bottom : null;
}

function growthAndVolatility(
  rows: Int32Array,
  year: ArrayLike<number>,
  cells: ArrayLike<number> | undefined,
): { readonly growth: number | null; readonly volatility: number | null } {
  if (cells === undefined) return { growth: null, volatility: null };
  let [first, final] = [-1, -1];
  const changes: number[] = [];
  for (const row of rows) {
    if (!(cells[row] > 0)) continue;
    if (final === -1) first = row;
    else if (year[row] - year[final] === 1) changes.push(Math.log(cells[row] / cells[final]));
    final = row;
  }
  if (first === final) return { growth: null, volatility: null };
  const growth = Math.log(cells[final] / cells[first]) / (year[final] - year[first]);
  return { growth, volatility: changes.length < fewestChanges ? null : deviation(changes) };
}

function deviation(values: readonly number[]): number {
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  const squares = values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  return Math.sqrt(squares / (values.length - 1));
}
