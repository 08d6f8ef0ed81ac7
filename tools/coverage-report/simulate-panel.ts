import type { PanelColumns } from '../../backend/stats';
import { type Draws, drawsFrom } from './normal-draws';
import type { Setting } from './setting';

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

export const trueSlope = 1;

const firstYear = 2001;
const furthest = horizons[horizons.length - 1];
const missingShare = 0.2;
const fewOwnRows = 5;
/** Correlation of the second regressor with the first. */
const regressorCorrelation = 0.5;

/**
 * y = Σ_k x_k + s_i·e with x_k = 2 + s_i·z_k; z_k and e are AR(1) with unit variance and the company's ρ_i.
 *
 * @param replication  0, 1, … below `mostReplications`.
 */
export function simulatePanel(setting: Setting, replication: number): SimulatedPanel {
  const draws = drawsFrom(setting.seed + replication);
  const own = ownIndex(setting, replication);
  const length = setting.years + furthest;
  const persistence = Array.from({ length: setting.companies }, (_, company) =>
    persistenceOf(setting, company === own, draws),
  );
  const shocks = commonShocks(setting, draws);
  const paths = persistence.map((rho, company) =>
    companyPath(setting, draws, { rho, size: sizeOf(setting, company), length, shocks }),
  );
  const keeps = (company: number, year: number): boolean =>
    isKept(setting, { isOwn: company === own, year }, draws);
  return {
    data: columnsOf(setting, paths, keeps),
    own: nameOf(own),
    ahead: horizons.map((steps) => yearAhead(paths[own], setting.years - 1 + steps, steps)),
  };
}

/** One company's years, those to come included. */
interface CompanyPath {
  readonly regressors: readonly Float64Array[];
  readonly error: Float64Array;
}

/** What hits all companies together; null where nothing does. */
interface CommonShocks {
  readonly error: Float64Array | null;
  readonly regressors: readonly Float64Array[] | null;
}

function ownIndex({ own, companies }: Setting, replication: number): number {
  if (own === 'each') return replication % companies;
  return own === 'largest' ? companies - 1 : 0;
}

/** exp(−1.5) for the first to exp(1.5) for the last company, in even steps of the exponent. */
function sizeOf({ sizes, companies }: Setting, company: number): number {
  return sizes === 'equal' ? 1 : Math.exp(-1.5 + (3 * company) / (companies - 1));
}

function persistenceOf({ persistence }: Setting, isOwn: boolean, draws: Draws): number {
  if (persistence.kind === 'like') return persistence.rho;
  if (persistence.kind === 'own apart') return isOwn ? persistence.own : persistence.peers;
  return persistence.from + (persistence.to - persistence.from) * draws.uniform();
}

function commonShocks(setting: Setting, draws: Draws): CommonShocks {
  const { commonShock, persistence, years } = setting;
  if (commonShock === 'none' || persistence.kind !== 'like') {
    return { error: null, regressors: null };
  }
  const path = (): Float64Array => autoregression(persistence.rho, years + furthest, draws);
  const error = path();
  return {
    error,
    regressors:
      commonShock === 'errors' ? null : Array.from({ length: setting.regressors }, () => path()),
  };
}

function companyPath(
  setting: Setting,
  draws: Draws,
  {
    rho,
    size,
    length,
    shocks,
  }: {
    readonly rho: number;
    readonly size: number;
    readonly length: number;
    readonly shocks: CommonShocks;
  },
): CompanyPath {
  const own = Array.from({ length: setting.regressors }, () => autoregression(rho, length, draws));
  const [first, second] = own;
  const correlated = own.length === 1 ? [first] : [first, mixed(first, second)];
  const regressors = correlated.map((path, k) =>
    withShock(path, shocks.regressors?.[k] ?? null).map((value) => 2 + size * value),
  );
  const error = withShock(autoregression(rho, length, draws), shocks.error).map(
    (value) => size * value,
  );
  return { regressors, error };
}

/** AR(1) with unit variance, from its stationary distribution on. */
function autoregression(rho: number, length: number, { normal }: Draws): Float64Array {
  const path = new Float64Array(length);
  const innovation = Math.sqrt(1 - rho * rho);
  path[0] = normal();
  for (let year = 1; year < length; year += 1) {
    path[year] = rho * path[year - 1] + innovation * normal();
  }
  return path;
}

function mixed(first: Float64Array, second: Float64Array): Float64Array {
  const rest = Math.sqrt(1 - regressorCorrelation ** 2);
  return second.map((value, year) => regressorCorrelation * first[year] + rest * value);
}

/** Half the variance from each. */
function withShock(path: Float64Array, shock: Float64Array | null): Float64Array {
  return shock === null ? path : path.map((value, year) => Math.SQRT1_2 * (value + shock[year]));
}

/** The own company always has its last year, so that the years ahead count from there. */
function isKept(
  { rows, years }: Setting,
  { isOwn, year }: { readonly isOwn: boolean; readonly year: number },
  { uniform }: Draws,
): boolean {
  if (rows === 'all') return true;
  if (rows === 'last five of the own') return !isOwn || year >= years - fewOwnRows;
  return uniform() >= missingShare || (isOwn && year === years - 1);
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

function expectedAt({ regressors }: CompanyPath, year: number): number {
  return regressors.reduce((sum, column) => sum + trueSlope * column[year], 0);
}

/** Names sort as their numbers do. */
function nameOf(company: number): string {
  return `F${String(company + 1).padStart(2, '0')}`;
}
