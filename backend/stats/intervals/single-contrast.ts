import type { WithinFit } from '../regression/within-fit';
import { type CalibratedError, errorFrom } from './calibrated-interval';
import type { Contrast } from './contrast';
import { correlationForm, fillYearDecays } from './correlation-product';
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
  const { sample, residuals } = fit;
  const decays = decaysOf(fit, persistence);
  const direct = rowWeights(fit, contrast);
  const rest = new Float64Array(direct.length);
  let squares = 0;
  let residualForms = 0;
  for (const weight of cosineWeights(sample.years.length, cosines)) {
    let lambda = 0;
    for (let row = 0; row < direct.length; row += 1) {
      const value = weight[sample.position[row]] * direct[row];
      rest[row] = value;
      lambda += value * residuals[row];
    }
    squares += lambda * lambda;
    takeOut(fit, rest);
    residualForms += correlationForm(rest, decays);
  }
  return errorFrom({
    years: sample.years.length,
    numerator: correlationForm(direct, decays),
    residualForm: residualForms / cosines,
    meanSquare: squares / cosines,
  });
}

function decaysOf({ sample }: WithinFit, persistence: Float64Array): Float64Array {
  const decays = new Float64Array(sample.year.length);
  for (let company = 0; company < persistence.length; company += 1) {
    const from = sample.starts[company];
    const span = { from, to: sample.starts[company + 1], persistence: persistence[company] };
    fillYearDecays(sample.year, span, decays, from);
  }
  return decays;
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

/** Leaves the part of a column that is orthogonal to the design: company means and basis. */
function takeOut({ sample, basis }: WithinFit, values: Float64Array): void {
  for (const column of basis) {
    let product = 0;
    for (let row = 0; row < values.length; row += 1) product += column[row] * values[row];
    for (let row = 0; row < values.length; row += 1) values[row] -= product * column[row];
  }
  const { starts } = sample;
  for (let company = 1; company < starts.length; company += 1) {
    const from = starts[company - 1];
    const to = starts[company];
    let sum = 0;
    for (let row = from; row < to; row += 1) sum += values[row];
    const mean = sum / (to - from);
    for (let row = from; row < to; row += 1) values[row] -= mean;
  }
}
