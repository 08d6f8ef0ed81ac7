import type { FitResult } from '../fit-result';
import { timesVector } from '../linear-algebra/square-matrix';
import type { WithinColumn } from '../panel/within-transform';
import type { WithinFit } from '../regression/within-fit';
import type { CompanyProduct } from './company-products';

const noOwnReason =
  'No company of two complete rows or more is the own one, so there is no standing.';
const notDeterminedReason = 'Without this company the slopes are no longer determined.';

/**
 * Slopes and the own company's standing without each company in turn, from company cross-products:
 * b₍ᵢ₎ = b − R⁻¹(I − S_i)⁻¹g_i. No refit; cost N·P².
 *
 * @param own  index of the own company; −1 where none is named or it has fewer than two complete rows.
 */
export function withoutEachCompany(
  fit: WithinFit,
  products: readonly CompanyProduct[],
  own: number,
): FitResult['withoutCompany'] {
  const companies = fit.sample.companies;
  return companies.map((company, left) => {
    if (!products[left].isDispensable) {
      return { company, slopes: null, standing: null, reason: notDeterminedReason };
    }
    const coefficients = coefficientsWithout(fit, products[left]);
    const slopes = coefficients.slice(fit.yearColumns);
    if (own === -1) return { company, slopes, standing: null, reason: noOwnReason };
    if (left === own) {
      return {
        company,
        slopes,
        standing: null,
        reason: 'Without the own company there is no standing.',
      };
    }
    if (companies.length === 2) {
      return {
        company,
        slopes,
        standing: null,
        reason: 'Without the only peer there is no standing.',
      };
    }
    return { company, slopes, standing: standingWithout(fit, coefficients, own, left) };
  });
}

function coefficientsWithout(fit: WithinFit, product: CompanyProduct): number[] {
  // W_i·W_i = (I − S_i)⁻¹: a company without which the slopes are determined has no eigenvalue dropped.
  const { adjustment, score } = product;
  const adjusted = timesVector(adjustment, timesVector(adjustment, score));
  const change = timesVector(fit.inverseR, adjusted);
  return Array.from(fit.coefficients, (value, k) => value - change[k]);
}

/** Own intercept minus the mean of the others' with the given coefficients and one company left out. */
function standingWithout(
  fit: WithinFit,
  coefficients: readonly number[],
  own: number,
  left: number,
): number {
  const distance = ({ means, meansTotal }: WithinColumn): number =>
    means[own] - (meansTotal - means[own] - means[left]) / (means.length - 2);
  return fit.columns.reduce(
    (rest, column, k) => rest - coefficients[k] * distance(column),
    distance(fit.outcome),
  );
}
