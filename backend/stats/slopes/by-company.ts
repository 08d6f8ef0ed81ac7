import { companyScores } from './company-scores';
import {
  noCompanyVarianceReason,
  type MatrixMethod,
  type SlopeCovariance,
} from './covariance-method';
import { scoreProducts } from './score-products';
import { slopeSandwich } from './slope-block';
import type { SlopeGround } from './slope-ground';

/** What the covariances by company on G − 1 degrees of freedom have in common. */
export const byCompany = {
  kind: 'matrix',
  degreesOfFreedom: ({ fit }: SlopeGround): number => fit.sample.companies.length - 1,
  noVarianceReason: noCompanyVarianceReason,
} satisfies Partial<MatrixMethod>;

/** factor · R₂₂⁻¹·Σ_i g_ig_i'·R₂₂⁻ᵀ with g_i the company's score. */
export function companySandwich(ground: SlopeGround, factor: number): SlopeCovariance {
  const middle = scoreProducts(companyScores(ground), ground.fit.slopes.length);
  return { matrix: slopeSandwich(ground.fit, middle).map((value) => factor * value), notes: [] };
}
