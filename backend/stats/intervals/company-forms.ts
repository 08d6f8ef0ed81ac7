import type { WithinFit } from '../regression/within-fit';
import { correlationProduct, fillYearDecays } from './correlation-product';

/**
 * What the calibrated interval of any contrast is made of, computed once a fit. With P coefficients beside the company
 * intercepts, B cosines c_j and the working correlation R_i = [ρ_i^|year − year'|]; U_i, e_i are the company's rows of
 * basis and residuals. Arrays by company and cosine are flattened, company first.
 */
export interface CompanyForms {
  readonly slopes: number;
  readonly years: number;
  readonly cosines: number;
  /** 1'R_i1 / T_i², one a company. */
  readonly meanVariance: Float64Array;
  /** U_i'R_i1 / T_i, P a company. */
  readonly meanWithBasis: Float64Array;
  /** Σ U_i'R_iU_i, P × P. */
  readonly basisVariance: Float64Array;
  /** Σ_t c_j·e / T_i, by company and cosine. */
  readonly meanScore: Float64Array;
  /** Σ_it c_j·e·u, P a cosine. */
  readonly basisScore: Float64Array;
  /** Σ_t c_j·u / T_i, P a company and cosine. */
  readonly meanProjection: Float64Array;
  /** Σ_it c_j·u·u', P × P a cosine. */
  readonly basisProjection: Float64Array;
  /** a'R_ia with a the demeaned c_j / T_i, by company and cosine. */
  readonly residualMean: Float64Array;
  /** a'R_i[B, U] with B the demeaned c_j·U, 2P a company and cosine. */
  readonly residualCross: Float64Array;
  /** Σ_i [B, U]'R_i[B, U], 2P × 2P a cosine. */
  readonly residualBasis: Float64Array;
}

/**
 * Cost n·B·P² operations and N·B·(2 + 3P) numbers: no n × N matrix.
 *
 * @param persistence  ρ_i, one a company.
 * @param weights  B cosines over the sample's years.
 */
export function companyForms(
  fit: WithinFit,
  persistence: Float64Array,
  weights: readonly Float64Array[],
): CompanyForms {
  const cosines = weights.length;
  const companies = fit.sample.companies.length;
  const slopes = fit.basis.length;
  const years = fit.sample.years.length;
  const forms: CompanyForms = {
    slopes,
    years,
    cosines,
    meanVariance: new Float64Array(companies),
    meanWithBasis: new Float64Array(companies * slopes),
    basisVariance: new Float64Array(slopes * slopes),
    meanScore: new Float64Array(companies * cosines),
    basisScore: new Float64Array(cosines * slopes),
    meanProjection: new Float64Array(companies * cosines * slopes),
    basisProjection: new Float64Array(cosines * slopes * slopes),
    residualMean: new Float64Array(companies * cosines),
    residualCross: new Float64Array(companies * cosines * 2 * slopes),
    residualBasis: new Float64Array(cosines * 4 * slopes * slopes),
  };
  const scratch = scratchOf(fit);
  for (let company = 0; company < companies; company += 1) {
    const rows = rowsOf(fit, { company, persistence: persistence[company], scratch });
    addVariance(forms, rows, scratch);
    for (let cosine = 0; cosine < cosines; cosine += 1) {
      addScores(forms, rows, weights[cosine], cosine);
      addResidualForms(forms, rows, { weight: weights[cosine], cosine, scratch });
    }
  }
  completeResidualBasis(forms);
  return forms;
}

/** One company's rows, from 0 on. */
interface CompanyRows {
  readonly company: number;
  readonly count: number;
  readonly position: Int32Array;
  readonly basis: readonly Float64Array[];
  readonly residuals: Float64Array;
  readonly decays: Float64Array;
}

/** Columns of one company's rows, used again for each. */
interface Scratch {
  /** The demeaned c_j / T_i and c_j·U: 1 + P columns. */
  readonly weighted: readonly Float64Array[];
  readonly product: Float64Array;
  readonly decays: Float64Array;
}

function scratchOf({ sample, basis }: WithinFit): Scratch {
  const { starts } = sample;
  let longest = 0;
  for (let company = 1; company < starts.length; company += 1) {
    longest = Math.max(longest, starts[company] - starts[company - 1]);
  }
  return {
    weighted: Array.from({ length: 1 + basis.length }, () => new Float64Array(longest)),
    product: new Float64Array(longest),
    decays: new Float64Array(longest),
  };
}

function rowsOf(
  fit: WithinFit,
  {
    company,
    persistence,
    scratch: { decays },
  }: { readonly company: number; readonly persistence: number; readonly scratch: Scratch },
): CompanyRows {
  const from = fit.sample.starts[company];
  const to = fit.sample.starts[company + 1];
  fillYearDecays(fit.sample.year, { from, to, persistence }, decays, 0);
  return {
    company,
    count: to - from,
    position: fit.sample.position.subarray(from, to),
    basis: fit.basis.map((column) => column.subarray(from, to)),
    residuals: fit.residuals.subarray(from, to),
    decays,
  };
}

function addVariance(forms: CompanyForms, rows: CompanyRows, scratch: Scratch): void {
  const size = forms.slopes;
  const { product } = scratch;
  const mean = scratch.weighted[0].fill(1 / rows.count);
  correlationProduct(mean, rows, product);
  forms.meanVariance[rows.company] = dotRows(mean, product, rows.count);
  for (let k = 0; k < size; k += 1) {
    forms.meanWithBasis[rows.company * size + k] = dotRows(rows.basis[k], product, rows.count);
  }
  for (let k = 0; k < size; k += 1) {
    correlationProduct(rows.basis[k], rows, product);
    for (let l = 0; l <= k; l += 1) {
      const sum = dotRows(rows.basis[l], product, rows.count);
      forms.basisVariance[k * size + l] += sum;
      if (l < k) forms.basisVariance[l * size + k] += sum;
    }
  }
}

function addScores(
  forms: CompanyForms,
  rows: CompanyRows,
  weight: Float64Array,
  cosine: number,
): void {
  const size = forms.slopes;
  const place = rows.company * forms.cosines + cosine;
  const { position, residuals, basis, count } = rows;
  let meanScore = 0;
  for (let row = 0; row < count; row += 1) meanScore += weight[position[row]] * residuals[row];
  forms.meanScore[place] = meanScore / count;
  for (let k = 0; k < size; k += 1) {
    const column = basis[k];
    let score = 0;
    let sum = 0;
    for (let row = 0; row < count; row += 1) {
      const weighted = weight[position[row]] * column[row];
      sum += weighted;
      score += weighted * residuals[row];
    }
    forms.basisScore[cosine * size + k] += score;
    forms.meanProjection[place * size + k] = sum / count;
    for (let l = 0; l <= k; l += 1) {
      const other = basis[l];
      let projection = 0;
      for (let row = 0; row < count; row += 1) {
        projection += weight[position[row]] * column[row] * other[row];
      }
      forms.basisProjection[(cosine * size + k) * size + l] += projection;
      if (l < k) forms.basisProjection[(cosine * size + l) * size + k] += projection;
    }
  }
}

function addResidualForms(
  forms: CompanyForms,
  rows: CompanyRows,
  {
    weight,
    cosine,
    scratch: { weighted, product },
  }: { readonly weight: Float64Array; readonly cosine: number; readonly scratch: Scratch },
): void {
  const size = forms.slopes;
  const double = 2 * size;
  const { count, basis } = rows;
  const place = rows.company * forms.cosines + cosine;
  weighRows(rows, weight, weighted);
  for (let k = 0; k <= size; k += 1) {
    correlationProduct(weighted[k], rows, product);
    const target = k === 0 ? forms.residualCross : forms.residualBasis;
    const at = k === 0 ? place * double : (cosine * double + k - 1) * double;
    if (k === 0) forms.residualMean[place] = dotRows(weighted[0], product, count);
    for (let l = Math.max(1, k); l <= size; l += 1) {
      target[at + l - 1] += dotRows(weighted[l], product, count);
    }
    for (let l = 0; l < size; l += 1) {
      target[at + size + l] += dotRows(basis[l], product, count);
    }
  }
}

/** Fills `weighted` with the company's demeaned c_j / T_i and c_j·U. */
function weighRows(
  { basis, position, count }: CompanyRows,
  weight: Float64Array,
  weighted: readonly Float64Array[],
): void {
  weighted.forEach((target, k) => {
    let sum = 0;
    for (let row = 0; row < count; row += 1) {
      const value =
        k === 0 ? weight[position[row]] / count : weight[position[row]] * basis[k - 1][row];
      target[row] = value;
      sum += value;
    }
    const mean = sum / count;
    for (let row = 0; row < count; row += 1) target[row] -= mean;
  });
}

/** Fills what `addResidualForms` leaves out: the block of U with U, the same for every cosine, and the lower triangle. */
function completeResidualBasis(forms: CompanyForms): void {
  const size = forms.slopes;
  const double = 2 * size;
  for (let cosine = 0; cosine < forms.cosines; cosine += 1) {
    const at = cosine * double * double;
    for (let k = 0; k < size; k += 1) {
      for (let l = 0; l < size; l += 1) {
        forms.residualBasis[at + (size + k) * double + size + l] =
          forms.basisVariance[k * size + l];
      }
    }
    for (let row = 1; row < double; row += 1) {
      for (let column = 0; column < row; column += 1) {
        forms.residualBasis[at + row * double + column] =
          forms.residualBasis[at + column * double + row];
      }
    }
  }
}

function dotRows(left: Float64Array, right: Float64Array, count: number): number {
  let sum = 0;
  for (let row = 0; row < count; row += 1) sum += left[row] * right[row];
  return sum;
}
