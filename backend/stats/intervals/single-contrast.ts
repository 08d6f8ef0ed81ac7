import type { WithinFit } from '../regression/within-fit';
import { type CalibratedError, errorFrom } from './calibrated-interval';
import type { Contrast } from './contrast';
import { correlatedSquare } from './correlation-product';

/**
 * The calibrated standard error of one contrast straight through the rows: for a fit of which nothing else is asked
 * it costs n·B·P operations and n numbers, where the forms of every contrast (`companyForms`) cost n·B·P².
 *
 * @param persistence  ρ_i, one a company.
 * @param weights  B cosines over the sample's years.
 */
export function singleContrastError(
  fit: WithinFit,
  contrast: Contrast,
  persistence: Float64Array,
  weights: readonly Float64Array[],
): CalibratedError {
  const years = fit.sample.years.length;
  const cosines = weights.length;
  const direct = rowWeights(fit, contrast);
  const { squares, projections } = sumOverRows(fit, direct, weights);
  const { numerator, residualForms } = formsOverCompanies(fit, {
    direct,
    weights,
    projections,
    persistence,
  });
  return errorFrom({
    years,
    numerator,
    residualForm: residualForms / cosines,
    meanSquare: squares / cosines,
    cosines,
  });
}

/** g_it = w_i/T_i + r'u_it. */
function rowWeights({ sample, basis }: WithinFit, contrast: Contrast): Float64Array {
  const direct = new Float64Array(sample.year.length);
  contrast.companies.forEach((company, index) => {
    const from = sample.starts[company];
    const to = sample.starts[company + 1];
    direct.fill(contrast.weights[index] / (to - from), from, to);
  });
  basis.forEach((column, k) => {
    const factor = contrast.slopePart[k];
    if (factor === 0) return;
    for (let row = 0; row < column.length; row += 1) direct[row] += factor * column[row];
  });
  return direct;
}

/** Σ_j (h_j'e)², and U'h_j, P a cosine. */
function sumOverRows(
  { sample, basis, residuals }: WithinFit,
  direct: Float64Array,
  weights: readonly Float64Array[],
): { readonly squares: number; readonly projections: readonly Float64Array[] } {
  const { position } = sample;
  const projectionOn = (weight: Float64Array, column: Float64Array): number => {
    let sum = 0;
    for (let row = 0; row < direct.length; row += 1) {
      sum += weight[position[row]] * direct[row] * column[row];
    }
    return sum;
  };
  let squares = 0;
  for (const weight of weights) squares += projectionOn(weight, residuals) ** 2;
  const projections = weights.map((weight) =>
    Float64Array.from(basis, (column) => projectionOn(weight, column)),
  );
  return { squares, projections };
}

/** Σ g_i'R_ig_i, and Σ_j Σ_i (Mh_j)_i'R_i(Mh_j)_i with Mh_j what the design leaves of h_j. */
function formsOverCompanies(
  fit: WithinFit,
  parts: {
    readonly direct: Float64Array;
    readonly weights: readonly Float64Array[];
    readonly projections: readonly Float64Array[];
    readonly persistence: Float64Array;
  },
): { readonly numerator: number; readonly residualForms: number } {
  const { sample, basis } = fit;
  const { direct, weights, projections, persistence } = parts;
  const { starts, year, position } = sample;
  let numerator = 0;
  let residualForms = 0;
  let rest = new Float64Array(64);
  for (let company = 0; company < persistence.length; company += 1) {
    const from = starts[company];
    const count = starts[company + 1] - from;
    if (count > rest.length) rest = new Float64Array(2 * count);
    const years = year.subarray(from, from + count);
    rest.set(direct.subarray(from, from + count));
    numerator += correlatedSquare(rest, years, persistence[company]);
    for (let cosine = 0; cosine < weights.length; cosine += 1) {
      const weight = weights[cosine];
      for (let row = 0; row < count; row += 1) {
        rest[row] = weight[position[from + row]] * direct[from + row];
      }
      for (let k = 0; k < basis.length; k += 1) {
        const column = basis[k];
        const projection = projections[cosine][k];
        for (let row = 0; row < count; row += 1) rest[row] -= projection * column[from + row];
      }
      demean(rest, count);
      residualForms += correlatedSquare(rest, years, persistence[company]);
    }
  }
  return { numerator, residualForms };
}

function demean(values: Float64Array, count: number): void {
  let sum = 0;
  for (let row = 0; row < count; row += 1) sum += values[row];
  const mean = sum / count;
  for (let row = 0; row < count; row += 1) values[row] -= mean;
}
