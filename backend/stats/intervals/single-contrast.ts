import { addOverRows, type RowRange } from '../linear-algebra/row-range';
import { dot } from '../linear-algebra/square-matrix';
import { sumOfSquares } from '../regression/sum-of-squares';
import type { WithinFit } from '../regression/within-fit';
import { type CalibratedError, errorFrom } from './calibrated-interval';
import type { Contrast } from './contrast';
import { correlatedSquare, fillYearDecays } from './correlation-product';

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
  const { direct, ofResiduals, ofBasis } = sumOverRows(fit, contrast);
  // A cosine weighs all rows of a year alike: h_j'e and U'h_j are sums over years.
  const squares = sumOfSquares(weights.map((weight) => dot(weight, ofResiduals)));
  const projections = weights.map((weight) =>
    Float64Array.from(ofBasis, (sums) => dot(weight, sums)),
  );
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

/** Takes so many rows at a time, or as many as one company has more. */
const blockRows = 512;

/** What the rows of a fit give a contrast. */
interface RowSums {
  /** g_it = w_i/T_i + r'u_it. */
  readonly direct: Float64Array;
  /** Σ g·e of each year's rows. */
  readonly ofResiduals: Float64Array;
  /** Σ g·u of each year's rows, P arrays. */
  readonly ofBasis: readonly Float64Array[];
}

function sumOverRows({ sample, basis, residuals }: WithinFit, contrast: Contrast): RowSums {
  const { starts, position, years } = sample;
  const direct = new Float64Array(position.length);
  contrast.companies.forEach((company, index) => {
    const rows = starts[company + 1] - starts[company];
    direct.fill(contrast.weights[index] / rows, starts[company], starts[company + 1]);
  });
  const ofResiduals = new Float64Array(years.length);
  const ofBasis = basis.map(() => new Float64Array(years.length));
  for (let from = 0; from < position.length; from += blockRows) {
    const rows = { from, to: Math.min(position.length, from + blockRows) };
    addOverRows(direct, basis, contrast.slopePart, rows);
    addByYear(ofResiduals, position, { left: direct, right: residuals, rows });
    basis.forEach((column, k) => {
      addByYear(ofBasis[k], position, { left: direct, right: column, rows });
    });
  }
  return { direct, ofResiduals, ofBasis };
}

/** sums[position] += left·right over a range of rows. */
function addByYear(
  sums: Float64Array,
  position: Int32Array,
  {
    left,
    right,
    rows: { from, to },
  }: { readonly left: Float64Array; readonly right: Float64Array; readonly rows: RowRange },
): void {
  for (let row = from; row < to; row += 1) sums[position[row]] += left[row] * right[row];
}

interface FormParts {
  readonly direct: Float64Array;
  readonly weights: readonly Float64Array[];
  readonly projections: readonly Float64Array[];
  readonly persistence: Float64Array;
}

/** Σ g_i'R_ig_i, and Σ_j Σ_i (Mh_j)_i'R_i(Mh_j)_i with Mh_j what the design leaves of h_j. */
interface Forms {
  readonly numerator: number;
  readonly residualForms: number;
}

function formsOverCompanies(fit: WithinFit, parts: FormParts): Forms {
  const { starts } = fit.sample;
  const companies = starts.length - 1;
  let scratch = scratchOf(blockRows, blockRows);
  let numerator = 0;
  let residualForms = 0;
  for (let first = 0; first < companies;) {
    let last = first + 1;
    while (last < companies && starts[last + 1] - starts[first] <= blockRows) last += 1;
    const rows = starts[last] - starts[first];
    if (rows > scratch.rest.length) scratch = scratchOf(rows, blockRows);
    const forms = formsOfBlock(fit, parts, { first, last, ...scratch });
    numerator += forms.numerator;
    residualForms += forms.residualForms;
    first = last;
  }
  return { numerator, residualForms };
}

/** Room for what is computed of a block's rows and companies, used again for each block. */
interface Scratch {
  readonly rest: Float64Array;
  readonly decays: Float64Array;
  readonly means: Float64Array;
}

function scratchOf(rows: number, companies: number): Scratch {
  return {
    rest: new Float64Array(rows),
    decays: new Float64Array(rows),
    means: new Float64Array(companies),
  };
}

/** The forms of the companies from `first` to before `last`. */
function formsOfBlock(
  { sample, basis }: WithinFit,
  { direct, weights, projections, persistence }: FormParts,
  { first, last, rest, decays, means }: Scratch & { readonly first: number; readonly last: number },
): Forms {
  const { starts, year } = sample;
  const from = starts[first];
  const to = starts[last];
  const ownDirect = direct.subarray(from, to);
  const ownBasis = basis.map((column) => column.subarray(from, to));
  const position = sample.position.subarray(from, to);
  for (let company = first; company < last; company += 1) {
    const span = {
      from: starts[company],
      to: starts[company + 1],
      persistence: persistence[company],
    };
    fillYearDecays(year, span, decays, span.from - from);
  }
  const rows = { from: 0, to: to - from };
  const numerator = correlatedSquare(ownDirect, { from: 0, to: to - from, decays, centre: 0 });
  let residualForms = 0;
  for (let cosine = 0; cosine < weights.length; cosine += 1) {
    const weight = weights[cosine];
    const taken = projections[cosine].map((value) => -value);
    for (let company = first; company < last; company += 1) {
      const end = starts[company + 1] - from;
      let sum = 0;
      for (let row = starts[company] - from; row < end; row += 1) {
        const value = weight[position[row]] * ownDirect[row];
        rest[row] = value;
        sum += value;
      }
      means[company - first] = sum / (starts[company + 1] - starts[company]);
    }
    // The basis sums to zero over a company's rows: it changes no mean.
    addOverRows(rest, ownBasis, taken, rows);
    for (let company = first; company < last; company += 1) {
      residualForms += correlatedSquare(rest, {
        from: starts[company] - from,
        to: starts[company + 1] - from,
        decays,
        centre: means[company - first],
      });
    }
  }
  return { numerator, residualForms };
}
