import type { WithinFit } from '../regression/within-fit';
import { type CalibratedError, errorFrom } from './calibrated-interval';
import type { Contrast } from './contrast';
import { correlationForm, yearDecays } from './correlation-product';
import { cosineWeights } from './cosine-weights';

/**
 * The calibrated standard error of one contrast straight through the rows: for a fit of which nothing else is asked
 * it costs n·B·P operations, where the forms of every contrast (`companyForms`) cost n·B·P².
 *
 * @param persistence  ρ_i, one a company.
 * @param cosines  B.
 */
export function singleContrastError(
  fit: WithinFit,
  contrast: Contrast,
  persistence: Float64Array,
  cosines: number,
): CalibratedError {
  const { sample, basis } = fit;
  const direct = rowWeights(fit, contrast);
  const weights = cosineWeights(sample.years.length, cosines);
  const numerator = sumOverCompanies(fit, persistence, (from, to, decays) =>
    correlationForm(direct.subarray(from, to), { count: to - from, decays }),
  );
  let squares = 0;
  let residualForms = 0;
  const rest = new Float64Array(direct.length);
  for (const weight of weights) {
    let lambda = 0;
    for (let row = 0; row < direct.length; row += 1) {
      const value = weight[sample.position[row]] * direct[row];
      rest[row] = value;
      lambda += value * fit.residuals[row];
    }
    squares += lambda * lambda;
    takeOut(basis, rest);
    residualForms += sumOverCompanies(fit, persistence, (from, to, decays) => {
      demean(rest, from, to);
      return correlationForm(rest.subarray(from, to), { count: to - from, decays });
    });
  }
  return errorFrom({
    years: sample.years.length,
    numerator,
    residualForm: residualForms / cosines,
    meanSquare: squares / cosines,
  });
}

/** g_it = w_i/T_i + r'u_it. */
function rowWeights({ sample, basis }: WithinFit, contrast: Contrast): Float64Array {
  const direct = new Float64Array(sample.year.length);
  basis.forEach((column, k) => {
    const factor = contrast.slopePart[k];
    if (factor === 0) return;
    for (let row = 0; row < column.length; row += 1) direct[row] += factor * column[row];
  });
  contrast.companies.forEach((company, index) => {
    const from = sample.starts[company];
    const to = sample.starts[company + 1];
    const share = contrast.weights[index] / (to - from);
    for (let row = from; row < to; row += 1) direct[row] += share;
  });
  return direct;
}

/** Leaves the part of a column that is orthogonal to the basis, which knows no company means. */
function takeOut(basis: readonly Float64Array[], values: Float64Array): void {
  for (const column of basis) {
    let product = 0;
    for (let row = 0; row < values.length; row += 1) product += column[row] * values[row];
    for (let row = 0; row < values.length; row += 1) values[row] -= product * column[row];
  }
}

function demean(values: Float64Array, from: number, to: number): void {
  let sum = 0;
  for (let row = from; row < to; row += 1) sum += values[row];
  const mean = sum / (to - from);
  for (let row = from; row < to; row += 1) values[row] -= mean;
}

function sumOverCompanies(
  { sample }: WithinFit,
  persistence: Float64Array,
  term: (from: number, to: number, decays: Float64Array) => number,
): number {
  let sum = 0;
  persistence.forEach((value, company) => {
    const from = sample.starts[company];
    const to = sample.starts[company + 1];
    sum += term(from, to, yearDecays(sample.year.subarray(from, to), value));
  });
  return sum;
}
