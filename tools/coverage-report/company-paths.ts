import { autoregression } from './autoregression';
import type { Draws } from './normal-draws';
import type { Setting } from './setting';

/** One company's years, those to come included. */
export interface CompanyPath {
  readonly regressors: readonly Float64Array[];
  readonly error: Float64Array;
}

/** What hits all companies together; null where nothing does. */
interface CommonShocks {
  readonly error: Float64Array | null;
  readonly regressors: readonly Float64Array[] | null;
}

/** Correlation of the second regressor with the first. */
const regressorCorrelation = 0.5;

export const trueSlope = 1;

/**
 * Draws every company's years: x_k = 2 + s_i·z_k and errors s_i·e, with z_k and e AR(1) with unit variance and the
 * company's ρ_i.
 *
 * @param own  index of the own company.
 * @param length  years, those to come included.
 */
export function companyPaths(
  setting: Setting,
  draws: Draws,
  { own, length }: { readonly own: number; readonly length: number },
): CompanyPath[] {
  const persistence = Array.from({ length: setting.companies }, (_, company) =>
    persistenceOf(setting, company === own, draws),
  );
  const shocks = commonShocks(setting, draws, length);
  return persistence.map((rho, company) =>
    companyPath(setting, draws, { rho, size: sizeOf(setting, company), length, shocks }),
  );
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

function commonShocks(setting: Setting, draws: Draws, length: number): CommonShocks {
  const { commonShock, persistence } = setting;
  if (commonShock === 'none' || persistence.kind !== 'like') {
    return { error: null, regressors: null };
  }
  const path = (): Float64Array => autoregression(persistence.rho, length, draws);
  const error = path();
  return {
    error,
    regressors:
      commonShock === 'errors' ? null : Array.from({ length: setting.regressors }, () => path()),
  };
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

function mixed(first: Float64Array, second: Float64Array): Float64Array {
  const rest = Math.sqrt(1 - regressorCorrelation ** 2);
  return second.map((value, year) => regressorCorrelation * first[year] + rest * value);
}

/** Half the variance from each. */
function withShock(path: Float64Array, shock: Float64Array | null): Float64Array {
  return shock === null ? path : path.map((value, year) => Math.SQRT1_2 * (value + shock[year]));
}

/** The market value that the regressors of a year let expect: every slope is 1, every intercept 0. */
export function expectedAt({ regressors }: CompanyPath, year: number): number {
  return regressors.reduce((sum, column) => sum + trueSlope * column[year], 0);
}
