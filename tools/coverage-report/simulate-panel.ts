import type { PanelColumns } from '../../backend/stats';
import { type CompanyPath, companyPaths, expectedAt } from './company-paths';
import { type Draws, drawsFrom } from './normal-draws';
import type { LastOwnRows, Setting } from './setting';

/** Years after the last one at which the plan is looked at. */
export const horizons = [1, 3, 5] as const;

/** One panel, and what is true of it: every slope is 1, every company's intercept 0. */
export interface SimulatedPanel {
  readonly data: PanelColumns;
  readonly own: string;
  /** What comes after the own company's last year. */
  readonly ahead: readonly YearAhead[];
}

export interface YearAhead {
  readonly year: number;
  readonly steps: (typeof horizons)[number];
  readonly regressors: readonly number[];
  /** The expected market value at these regressors. */
  readonly expected: number;
  /** The market value that comes. */
  readonly value: number;
}

const firstYear = 2001;
const furthest = horizons[horizons.length - 1];
const missingShare = 0.2;
const lastOwnRows: Readonly<Record<LastOwnRows, number>> = {
  'last 3 of the own': 3,
  'last 5 of the own': 5,
  'last 10 of the own': 10,
  'last 14 of the own': 14,
};

/**
 * y = Σ_k x_k + s_i·e, as `companyPaths` draws them, in the rows that the setting leaves.
 *
 * @param replication  0, 1, … below `mostReplications`.
 */
export function simulatePanel(setting: Setting, replication: number): SimulatedPanel {
  const draws = drawsFrom(setting.seed + replication);
  const own = ownIndex(setting, replication);
  const paths = companyPaths(setting, draws, { own, length: setting.years + furthest });
  const keeps = (company: number, year: number): boolean =>
    isKept(setting, { isOwn: company === own, year }, draws);
  return {
    data: columnsOf(setting, paths, keeps),
    own: nameOf(own),
    ahead: horizons.map((steps) => yearAhead(paths[own], setting.years - 1 + steps, steps)),
  };
}

function ownIndex({ own, companies }: Setting, replication: number): number {
  if (own === 'each') return replication % companies;
  return own === 'largest' ? companies - 1 : 0;
}

/** The own company always has its last year, so that the years ahead count from there. */
function isKept(
  { rows, years }: Setting,
  { isOwn, year }: { readonly isOwn: boolean; readonly year: number },
  { uniform }: Draws,
): boolean {
  if (rows === 'all') return true;
  if (rows === 'one in five missing') {
    return uniform() >= missingShare || (isOwn && year === years - 1);
  }
  return !isOwn || year >= years - lastOwnRows[rows];
}

function columnsOf(
  { companies, years, regressors }: Setting,
  paths: readonly CompanyPath[],
  keeps: (company: number, year: number) => boolean,
): PanelColumns {
  const rows: { readonly company: number; readonly year: number }[] = [];
  for (let company = 0; company < companies; company += 1) {
    for (let year = 0; year < years; year += 1) {
      if (keeps(company, year)) rows.push({ company, year });
    }
  }
  return {
    companies: paths.map((_, company) => nameOf(company)),
    company: Int32Array.from(rows, ({ company }) => company),
    year: Int32Array.from(rows, ({ year }) => firstYear + year),
    outcome: {
      name: 'y',
      values: Float64Array.from(rows, ({ company, year }) => valueAt(paths[company], year)),
    },
    regressors: Array.from({ length: regressors }, (_, k) => ({
      name: `x${k + 1}`,
      values: Float64Array.from(rows, ({ company, year }) => paths[company].regressors[k][year]),
    })),
    fileRow: Int32Array.from(rows, (_, row) => row + 2),
  };
}

function yearAhead(path: CompanyPath, year: number, steps: YearAhead['steps']): YearAhead {
  const expected = expectedAt(path, year);
  return {
    year: firstYear + year,
    steps,
    regressors: path.regressors.map((column) => column[year]),
    expected,
    value: expected + path.error[year],
  };
}

function valueAt(path: CompanyPath, year: number): number {
  return expectedAt(path, year) + path.error[year];
}

/** Names sort as their numbers do. */
function nameOf(company: number): string {
  return `F${String(company + 1).padStart(2, '0')}`;
}
