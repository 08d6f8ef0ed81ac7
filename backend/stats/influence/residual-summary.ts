import type { ResidualPoint, ResidualSummary } from '../evidence/evidence';
import type { WithinFit } from '../regression/within-fit';
import { residualsByCompany, residualsByYear } from './residual-groups';
import { type RowInfluence, rowInfluence } from './row-influence';
import { varianceInflation } from './variance-inflation';

/** More points than this are neither drawn nor sent. */
export const mostResidualPoints = 5000;

const mostLargest = 20;

/**
 * The residuals of a fit by company, by year, row by row against fitted, and the largest. Figures in the model's scale.
 * Points stand in the sample's order; where there are more than `mostResidualPoints`, the largest |studentised| stay.
 */
export function residualSummary({ fit }: { readonly fit: WithinFit }): ResidualSummary {
  const influence = rowInfluence(fit);
  const order = largestFirst(influence.studentised);
  const companyOf = companyOfRow(fit);
  const pointOf = (row: number): ResidualPoint =>
    residualPoint({ fit, influence, row, company: companyOf[row] });
  const inflation = varianceInflation(fit);
  return {
    byCompany: residualsByCompany(fit),
    byYear: residualsByYear(fit),
    points: Array.from(order.slice(0, mostResidualPoints).sort(), pointOf),
    of: order.length,
    largest: Array.from(order.subarray(0, mostLargest), pointOf),
    varianceInflation: fit.sample.regressorNames.map((name, k) => ({ name, value: inflation[k] })),
  };
}

/** Rows by |studentised|, largest first, those without one last, ties in the sample's order. */
function largestFirst(studentised: Float64Array): Int32Array {
  const size = studentised.map((value) => (Number.isNaN(value) ? -1 : Math.abs(value)));
  return Int32Array.from(size, (_, row) => row).sort(
    (left, right) => size[right] - size[left] || left - right,
  );
}

function companyOfRow({ sample }: WithinFit): Int32Array {
  const result = new Int32Array(sample.year.length);
  sample.companies.forEach((_, company) => {
    result.fill(company, sample.starts[company], sample.starts[company + 1]);
  });
  return result;
}

function residualPoint(place: {
  readonly fit: WithinFit;
  readonly influence: RowInfluence;
  readonly row: number;
  readonly company: number;
}): ResidualPoint {
  const { fit, influence, row, company } = place;
  const { sample } = fit;
  return {
    company: sample.companies[company],
    year: sample.year[row],
    fileRow: sample.fileRow[row],
    regressors: sample.regressors.map((column) => column[row]),
    actual: sample.outcome[row],
    fitted: sample.outcome[row] - fit.residuals[row],
    residual: fit.residuals[row],
    leverage: influence.leverage[row],
    studentised: orNull(influence.studentised[row]),
    cook: orNull(influence.cook[row]),
  };
}

function orNull(value: number): number | null {
  return Number.isNaN(value) ? null : value;
}
