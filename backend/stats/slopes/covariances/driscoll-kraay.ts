import { addScaled, type SquareMatrix, transpose } from '../../linear-algebra/square-matrix';
import { exactRowsReason, type MatrixMethod } from '../covariance-method';
import { groupScores, scoreProducts } from '../score-products';
import { slopeBlock, slopeSandwich } from '../slope-block';
import type { SlopeGround } from '../slope-ground';

/** Companies' two rows mirror each other, so the two years' scores are equal, and they sum to zero. */
const twoYearsReason =
  'No variance is left to judge it by: with two fiscal years the residuals of one mirror those of the other, so what years add to the variance is zero by construction.';

/** Shocks that hit all companies together and last for some years. */
export const driscollKraay: MatrixMethod = {
  kind: 'matrix',
  code: 'driscoll-kraay',
  name: 'Over all companies, by year',
  definition:
    'Years clustered over all companies, with Bartlett weights up to lag floor(T^¼) by the year’s position in the sample, no factor; t with T − 1 degrees of freedom.',
  source: 'Driscoll & Kraay (1998), Review of Economics and Statistics 80, 549–560',
  reference: [
    'within_se.driscoll_kraay_L1',
    'within_se.driscoll_kraay_L2',
    'within_se.driscoll_kraay_L3',
  ],
  degreesOfFreedom: ({ fit }) => fit.sample.years.length - 1,
  noVarianceReason: ({ fit }) =>
    fit.sample.years.length === 2 ? twoYearsReason : exactRowsReason(),
  covariance: (ground) => ({
    matrix: driscollKraayCovariance(ground, bartlettLag(ground.fit.sample.years.length)),
    notes: [],
  }),
};

/** floor(T^¼). */
export function bartlettLag(years: number): number {
  let lag = 1;
  while ((lag + 1) ** 4 <= years) lag += 1;
  return lag;
}

/** R₂₂⁻¹·(Γ₀ + Σ_l (1 − l/(L + 1))(Γ_l + Γ_l'))·R₂₂⁻ᵀ, Γ_l = Σₜ hₜhₜ₋ₗ' with hₜ the score of year t over all companies. */
export function driscollKraayCovariance({ fit }: SlopeGround, lags: number): SquareMatrix {
  const size = fit.slopes.length;
  const design = { basis: slopeBlock(fit).basis, residuals: fit.residuals };
  const scores = groupScores(design, fit.sample.position, fit.sample.years.length);
  const middle = scoreProducts(scores, size);
  for (let lag = 1; lag <= lags; lag += 1) {
    const products = scoreProducts(scores, size, lag);
    const weight = 1 - lag / (lags + 1);
    addScaled(middle, products, weight);
    addScaled(middle, transpose(products, size), weight);
  }
  return slopeSandwich(fit, middle);
}
