import type { FitResult } from '../fit-result';
import { symmetricPower } from '../linear-algebra/symmetric-power';
import { timesVector } from '../linear-algebra/square-matrix';
import type { WithinColumn } from '../panel/within-transform';
import type { WithinFit } from '../regression/within-fit';
import type { CompanyProduct } from './company-products';

const noOwnReason =
  'No company of two complete rows or more is the own one, so there is no standing.';
const notDeterminedReason = 'Without this company the slopes are no longer determined.';

/**
 * Slopes and the own company's standing without each company in turn, from company cross-products:
 * b₍ᵢ₎ = b − R⁻¹(I − S_i)⁻¹g_i. No refit; cost N·(K³ + K).
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
  const size = fit.coefficients.length;
  const rest = product.cross.map((value, index) => (index % (size + 1) === 0 ? 1 : 0) - value);
  const inverse = symmetricPower(rest, size, -1, 0).matrix;
  const change = timesVector(fit.inverseR, timesVector(inverse, product.score));
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
