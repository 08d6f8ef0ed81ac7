import type { WithinFit } from '../regression/within-fit';
import { correlationProduct, yearDecays } from './correlation-product';
import { cosineWeights } from './cosine-weights';

/**
 * What the calibrated interval of any contrast is made of, computed once a fit. With K slopes, B cosines c_j and
 * the working correlation R_i = [ρ_i^|year − year'|]; U_i, e_i are the company's rows of basis and residuals.
 * Arrays by company and cosine are flattened, company first.
 */
export interface CompanyForms {
  readonly slopes: number;
  readonly years: number;
  readonly cosines: number;
  /** 1'R_i1 / T_i², one a company. */
  readonly meanVariance: Float64Array;
  /** U_i'R_i1 / T_i, K a company. */
  readonly meanWithBasis: Float64Array;
  /** Σ U_i'R_iU_i, K × K. */
  readonly basisVariance: Float64Array;
  /** Σ_t c_j·e / T_i, by company and cosine. */
  readonly meanScore: Float64Array;
  /** Σ_it c_j·e·u, K a cosine. */
  readonly basisScore: Float64Array;
  /** Σ_t c_j·u / T_i, K a company and cosine. */
  readonly meanProjection: Float64Array;
  /** Σ_it c_j·u·u', K × K a cosine. */
  readonly basisProjection: Float64Array;
  /** a'R_ia with a the demeaned c_j / T_i, by company and cosine. */
  readonly residualMean: Float64Array;
  /** a'R_i[B, U] with B the demeaned c_j·U, 2K a company and cosine. */
  readonly residualCross: Float64Array;
  /** Σ_i [B, U]'R_i[B, U], 2K × 2K a cosine. */
  readonly residualBasis: Float64Array;
}

/**
 * Cost n·B·K² operations and N·B·(2 + 3K) numbers: no n × N matrix.
 *
 * @param persistence  ρ_i, one a company.
 */
export function companyForms(
  fit: WithinFit,
  persistence: Float64Array,
  cosines: number,
): CompanyForms {
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
  const weights = cosineWeights(years, cosines);
  for (let company = 0; company < companies; company += 1) {
    const rows = rowsOf(fit, company, persistence[company]);
    addVariance(forms, rows);
    weights.forEach((weight, cosine) => {
      const values = Float64Array.from(rows.position, (position) => weight[position]);
      addScores(forms, rows, values, cosine);
      addResidualForms(forms, rows, values, cosine);
    });
  }
  return forms;
}

interface CompanyRows {
  readonly company: number;
  readonly count: number;
  readonly position: Int32Array;
  readonly basis: readonly Float64Array[];
  readonly residuals: Float64Array;
  readonly decays: Float64Array;
}

function rowsOf(fit: WithinFit, company: number, persistence: number): CompanyRows {
  const from = fit.sample.starts[company];
  const to = fit.sample.starts[company + 1];
  return {
    company,
    count: to - from,
    position: fit.sample.position.subarray(from, to),
    basis: fit.basis.map((column) => column.subarray(from, to)),
    residuals: fit.residuals.subarray(from, to),
    decays: yearDecays(fit.sample.year.subarray(from, to), persistence),
  };
}

function addVariance(forms: CompanyForms, rows: CompanyRows): void {
  const size = forms.slopes;
  const mean = new Float64Array(rows.count).fill(1 / rows.count);
  const gram = correlatedGram(rows, [mean, ...rows.basis]);
  forms.meanVariance[rows.company] = gram[0];
  for (let k = 0; k < size; k += 1) {
    forms.meanWithBasis[rows.company * size + k] = gram[k + 1];
    for (let l = 0; l < size; l += 1) {
      forms.basisVariance[k * size + l] += gram[(k + 1) * (size + 1) + l + 1];
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
  for (let row = 0; row < rows.count; row += 1) {
    const weighted = weight[row] * rows.residuals[row];
    forms.meanScore[place] += weighted / rows.count;
    for (let k = 0; k < size; k += 1) {
      const value = rows.basis[k][row];
      forms.basisScore[cosine * size + k] += weighted * value;
      forms.meanProjection[place * size + k] += (weight[row] * value) / rows.count;
      for (let l = 0; l < size; l += 1) {
        forms.basisProjection[(cosine * size + k) * size + l] +=
          weight[row] * value * rows.basis[l][row];
      }
    }
  }
}

function addResidualForms(
  forms: CompanyForms,
  rows: CompanyRows,
  weight: Float64Array,
  cosine: number,
): void {
  const double = 2 * forms.slopes;
  const place = rows.company * forms.cosines + cosine;
  const mean = demeaned(weight.map((value) => value / rows.count));
  const weighted = rows.basis.map((column) =>
    demeaned(column.map((value, row) => value * weight[row])),
  );
  const gram = correlatedGram(rows, [mean, ...weighted, ...rows.basis]);
  forms.residualMean[place] = gram[0];
  for (let k = 0; k < double; k += 1) {
    forms.residualCross[place * double + k] = gram[k + 1];
    for (let l = 0; l < double; l += 1) {
      forms.residualBasis[(cosine * double + k) * double + l] +=
        gram[(k + 1) * (double + 1) + l + 1];
    }
  }
}

/** Z'R_iZ, row-major. */
function correlatedGram(rows: CompanyRows, columns: readonly Float64Array[]): Float64Array {
  const size = columns.length;
  const gram = new Float64Array(size * size);
  const product = new Float64Array(rows.count);
  columns.forEach((column, k) => {
    correlationProduct(column, rows.decays, product);
    for (let l = 0; l <= k; l += 1) {
      let sum = 0;
      for (let row = 0; row < rows.count; row += 1) sum += columns[l][row] * product[row];
      gram[k * size + l] = sum;
      gram[l * size + k] = sum;
    }
  });
  return gram;
}

function demeaned(values: Float64Array): Float64Array {
  let sum = 0;
  for (const value of values) sum += value;
  const mean = sum / values.length;
  return values.map((value) => value - mean);
}
