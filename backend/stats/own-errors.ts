import type { IntervalContext } from './intervals/interval-context';
import { correlatedSquare, fillYearDecays } from './intervals/correlation-product';
import type { OwnErrors } from './prediction';

/**
 * The own company's errors for bands and carried gaps: s² = Σe²/(T_own − f), f = ΣΣρ^|year − year'|/T_own, which is what
 * the own intercept takes out of persistent errors.
 *
 * @param own  index of the own company.
 */
export function ownErrorsOf({ fit, persistence }: IntervalContext, own: number): OwnErrors {
  const { sample, residuals } = fit;
  const from = sample.starts[own];
  const to = sample.starts[own + 1];
  const years = sample.year.subarray(from, to);
  const rows = to - from;
  const used = persistence.pooled === null ? null : persistence.used[own];
  const ones = new Float64Array(rows).fill(1);
  const decays = new Float64Array(rows);
  fillYearDecays(sample.year, { from, to, persistence: used ?? 0 }, decays, 0);
  const taken = correlatedSquare(ones, { from: 0, to: rows, decays, centre: 0 }) / rows;
  let squares = 0;
  for (let row = from; row < to; row += 1) squares += residuals[row] * residuals[row];
  return {
    persistence: used,
    persistenceReason: persistence.reason,
    years: Array.from(years),
    variance: squares / (rows - taken),
  };
}
