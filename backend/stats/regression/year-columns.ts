import type { PanelSample } from '../panel/panel-sample';
import { StatsError } from '../stats-error';

/** With as many years 6 companies take about 10 seconds on one core, 50 take about a minute and a half. */
const mostYears = 100;

/**
 * Columns of the year effects: T − 1, one a year but the last, 1 in its own year, −1 in the last one and 0 elsewhere.
 * With them the effects sum to zero over the sample's years, unweighted, and the last one is minus the sum of the others.
 * What follows costs rows times cosines times the square of the years, and companies times their cube: hence at most 100
 * years.
 *
 * @throws {StatsError} 'too-many-years' for more than 100; 'disconnected-years' where companies and years fall into parts
 *   that share neither: between them no effect can be compared.
 */
export function yearColumns(sample: PanelSample): Float64Array[] {
  refuseTooMany(sample);
  refuseDisconnected(sample);
  const last = sample.years.length - 1;
  return Array.from({ length: last }, (_, year) =>
    Float64Array.from(sample.position, (position) => {
      if (position === year) return 1;
      return position === last ? -1 : 0;
    }),
  );
}

/** Effects of all T years from the coefficients of the year columns. */
export function yearEffectsOf(coefficients: Float64Array): number[] {
  const last = coefficients.reduce((sum, value) => sum - value, 0);
  return [...coefficients, last];
}

/** Weights of the year columns' coefficients that make the effect of one year. */
export function yearWeights(years: number, position: number): Float64Array {
  const weights = new Float64Array(years - 1);
  if (position === years - 1) weights.fill(-1);
  else weights[position] = 1;
  return weights;
}

function refuseTooMany({ years }: PanelSample): void {
  if (years.length <= mostYears) return;
  throw new StatsError(
    'too-many-years',
    `expected at most ${mostYears} different fiscal years with year effects, whose cost grows with their square; found ${years.length}: leave the year effects out, or fit fewer years`,
  );
}

function refuseDisconnected(sample: PanelSample): void {
  const parts = partsOf(sample);
  if (parts.length < 2) return;
  const words = parts.map(
    ({ companies, years }) => `${companies.join(', ')} (${years[0]} to ${years[years.length - 1]})`,
  );
  throw new StatsError(
    'disconnected-years',
    `the companies fall into ${parts.length} parts that share no fiscal year, so year effects cannot be told from company effects: ${words.join('; ')}`,
    { companies: parts.flatMap(({ companies }) => companies) },
  );
}

interface Part {
  readonly companies: readonly string[];
  readonly years: readonly number[];
}

/** Connected parts of the graph whose nodes are companies and years, and whose edges are rows. */
function partsOf(sample: PanelSample): Part[] {
  const companies = sample.companies.length;
  const parent = Int32Array.from({ length: companies + sample.years.length }, (_, node) => node);
  const rootOf = (node: number): number => {
    let root = node;
    while (parent[root] !== root) {
      parent[root] = parent[parent[root]];
      root = parent[root];
    }
    return root;
  };
  for (let company = 0; company < companies; company += 1) {
    for (let row = sample.starts[company]; row < sample.starts[company + 1]; row += 1) {
      parent[rootOf(company)] = rootOf(companies + sample.position[row]);
    }
  }
  const roots = [...new Set(parent.map((_, node) => rootOf(node)))];
  return roots.map((root) => ({
    companies: sample.companies.filter((_, company) => rootOf(company) === root),
    years: sample.years.filter((_, year) => rootOf(companies + year) === root),
  }));
}
