import type { ResidualGroup, ResidualSummary } from '../evidence/evidence';
import type { WithinFit } from '../regression/within-fit';

/** Residuals of each company: they sum to zero. */
export function residualsByCompany({ sample, residuals }: WithinFit): ResidualGroup[] {
  return sample.companies.map((label, company) => {
    const { mean: _, ...group } = groupOf(
      label,
      residuals.subarray(sample.starts[company], sample.starts[company + 1]),
    );
    return group;
  });
}

/** Residuals of each year, with their mean: what hit all companies in that year. */
export function residualsByYear({ sample, residuals }: WithinFit): ResidualSummary['byYear'] {
  const counts = new Int32Array(sample.years.length);
  for (const position of sample.position) counts[position] += 1;
  const groups = Array.from(counts, (count) => new Float64Array(count));
  const filled = new Int32Array(sample.years.length);
  residuals.forEach((value, row) => {
    const position = sample.position[row];
    groups[position][filled[position]] = value;
    filled[position] += 1;
  });
  return groups.map((values, position) => groupOf(String(sample.years[position]), values));
}

/**
 * Count, standard deviation (root of the mean squared distance from the group's mean, so that one row has 0) and the
 * residual that lies farthest from zero, with its sign.
 */
function groupOf(label: string, values: Float64Array): ResidualSummary['byYear'][number] {
  const count = values.length;
  let sum = 0;
  let largest = 0;
  for (const value of values) {
    sum += value;
    if (Math.abs(value) > Math.abs(largest)) largest = value;
  }
  const mean = sum / count;
  let squares = 0;
  for (const value of values) squares += (value - mean) ** 2;
  return { label, count, standardDeviation: Math.sqrt(squares / count), largest, mean };
}
