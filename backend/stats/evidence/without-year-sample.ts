import type { PanelSample } from '../panel/panel-sample';

/** What a sample becomes without one year, and which companies leave it because a single row is left to them. */
export interface SampleWithoutYear {
  readonly sample: PanelSample;
  readonly leftOut: readonly string[];
}

/** Drops the rows of one year, and the companies that this leaves with one row or none. */
export function withoutYearSample(sample: PanelSample, year: number): SampleWithoutYear {
  const rows: number[] = [];
  const companies: string[] = [];
  const leftOut: string[] = [];
  const starts = [0];
  sample.companies.forEach((company, index) => {
    const kept: number[] = [];
    for (let row = sample.starts[index]; row < sample.starts[index + 1]; row += 1) {
      if (sample.year[row] !== year) kept.push(row);
    }
    if (kept.length < 2) {
      leftOut.push(company);
      return;
    }
    companies.push(company);
    for (const row of kept) rows.push(row);
    starts.push(rows.length);
  });
  const pick = (values: Float64Array): Float64Array =>
    Float64Array.from(rows, (row) => values[row]);
  const years = Int32Array.from(rows, (row) => sample.year[row]);
  const present = new Set(years);
  const kept = sample.years.filter((value) => present.has(value));
  const positions = new Map(kept.map((value, position) => [value, position]));
  const outcome = pick(sample.outcome);
  const regressors = sample.regressors.map(pick);
  return {
    leftOut,
    sample: {
      ...sample,
      companies,
      starts: Int32Array.from(starts),
      year: years,
      position: years.map((value) => positions.get(value) ?? -1),
      years: kept,
      outcome,
      regressors,
      levels:
        sample.levels.outcome === sample.outcome
          ? { outcome, regressors }
          : {
              outcome: pick(sample.levels.outcome),
              regressors: sample.levels.regressors.map(pick),
            },
      fileRow: Int32Array.from(rows, (row) => sample.fileRow[row]),
    },
  };
}
