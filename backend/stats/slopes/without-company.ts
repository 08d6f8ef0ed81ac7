import type { FitResult } from '../fit-result';
import { dot, timesVector } from '../linear-algebra/square-matrix';
import { solveUpperTransposed } from '../linear-algebra/triangular';
import type { WithinColumn } from '../panel/within-transform';
import type { WithinFit } from '../regression/within-fit';
import type { CompanyProduct } from './company-products';

const noOwnReason =
  'No company of two complete rows or more is the own one, so there is no standing.';
const notDeterminedReason = 'Without this company the slopes are no longer determined.';
const fallenApartReason =
  'Without this company the fiscal years fall into parts that share no company, so there is no standing.';

/** Share of a contrast that may lie outside what the other companies determine: rounding, by its norm. */
const determinedTolerance = 1e-5;

/**
 * Slopes and the own company's standing without each company in turn, from company cross-products:
 * b₍ᵢ₎ = b − R⁻¹(I − S_i)⁻¹g_i. Where the company alone has a year, the inverse is a pseudo-inverse: that year's effect
 * is of no account to the others. No refit; cost N·P², and N·P³ for companies with years of their own.
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
    const distances = standingDistances(fit, own, left);
    if (!isDetermined(fit, products[left], distances)) {
      return { company, slopes, standing: null, reason: fallenApartReason };
    }
    const ofOutcome = standingDistance(fit.outcome, own, left);
    return { company, slopes, standing: ofOutcome - dot(distances, coefficients) };
  });
}

function coefficientsWithout(fit: WithinFit, product: CompanyProduct): number[] {
  // W_i·W_i = (I − S_i)⁺: the directions it drops belong to year columns, whose change the slopes do not feel.
  const { adjustment, score } = product;
  const adjusted = timesVector(adjustment, timesVector(adjustment, score));
  const change = timesVector(fit.inverseR, adjusted);
  return Array.from(fit.coefficients, (value, k) => value - change[k]);
}

/** Own mean less the mean of the peers' that are left. */
function standingDistance({ means, meansTotal }: WithinColumn, own: number, left: number): number {
  return means[own] - (meansTotal - means[own] - means[left]) / (means.length - 2);
}

function standingDistances(fit: WithinFit, own: number, left: number): number[] {
  return fit.columns.map((column) => standingDistance(column, own, left));
}

/** Whether the other companies determine this contrast of the coefficients. */
function isDetermined(
  fit: WithinFit,
  { determined }: CompanyProduct,
  weights: readonly number[],
): boolean {
  if (determined === null) return true;
  const contrast = solveUpperTransposed(fit.r, weights);
  const kept = timesVector(determined, contrast);
  const lost = contrast.map((value, k) => value - kept[k]);
  return Math.sqrt(dot(lost, lost)) <= determinedTolerance * Math.sqrt(dot(contrast, contrast));
}
