import type { PanelSample } from '../panel/panel-sample';

/** What a sample becomes without one year, and which companies leave it because a single row is left to them. */
export interface SampleWithoutYear {
  readonly sample: PanelSample;
  readonly leftOut: readonly string[];
}

/** Drops the rows of one year, and the companies that this leaves with one row or none. */
export function withoutYearSample(sample: PanelSample, year: number): SampleWithoutYear {
  const { rows, starts, companies, leftOut } = keptRows(sample, year);
  const pick = (values: Float64Array): Float64Array => {
    const picked = new Float64Array(rows.length);
    for (let index = 0; index < rows.length; index += 1) picked[index] = values[rows[index]];
    return picked;
  };
  const pickWhole = (values: Int32Array): Int32Array => {
    const picked = new Int32Array(rows.length);
    for (let index = 0; index < rows.length; index += 1) picked[index] = values[rows[index]];
    return picked;
  };
  const outcome = pick(sample.outcome);
  const regressors = sample.regressors.map(pick);
  const isInLevels = sample.levels.outcome === sample.outcome;
  const kept: PanelSample = {
    ...sample,
    companies,
    starts,
    year: pickWhole(sample.year),
    ...placed(sample, pickWhole(sample.position)),
    outcome,
    regressors,
    levels: isInLevels
      ? { outcome, regressors }
      : { outcome: pick(sample.levels.outcome), regressors: sample.levels.regressors.map(pick) },
    fileRow: pickWhole(sample.fileRow),
  };
  return { leftOut, sample: kept };
}

interface KeptRows {
  /** Rows of the whole sample, in its order. */
  readonly rows: Int32Array;
  readonly starts: Int32Array;
  readonly companies: readonly string[];
  readonly leftOut: readonly string[];
}

function keptRows(sample: PanelSample, year: number): KeptRows {
  const rows = new Int32Array(sample.year.length);
  const starts = new Int32Array(sample.companies.length + 1);
  const companies: string[] = [];
  const leftOut: string[] = [];
  let count = 0;
  sample.companies.forEach((company, index) => {
    const first = count;
    for (let row = sample.starts[index]; row < sample.starts[index + 1]; row += 1) {
      if (sample.year[row] !== year) rows[count++] = row;
    }
    if (count - first < 2) {
      leftOut.push(company);
      count = first;
      return;
    }
    companies.push(company);
    starts[companies.length] = count;
  });
  return {
    rows: rows.subarray(0, count),
    starts: starts.subarray(0, companies.length + 1),
    companies,
    leftOut,
  };
}

/** Years that are still there, and each row's position among them. */
function placed(
  { years }: PanelSample,
  position: Int32Array,
): Pick<PanelSample, 'years' | 'position'> {
  const moved = new Int32Array(years.length).fill(-1);
  for (const place of position) moved[place] = 0;
  const kept = years.filter((_, place) => moved[place] === 0);
  let next = 0;
  for (let place = 0; place < moved.length; place += 1) {
    if (moved[place] === 0) moved[place] = next++;
  }
  for (let row = 0; row < position.length; row += 1) position[row] = moved[position[row]];
  return { years: kept, position };
}
