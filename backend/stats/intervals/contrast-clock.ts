import type { PanelSample } from '../panel/panel-sample';
import type { Contrast } from './contrast';
import { cosineWeights, fewestCosines } from './cosine-weights';

/** A company with rows in fewer than this share of the sample's years is there for a short time only. */
const shortShare = 0.5;

/** A contrast rests on such companies where they carry this share of Σ w_i²/T_i. */
const restingShare = 0.5;

/**
 * The cosines of a contrast over the years. On the calendar they run evenly from the sample's first year to its last:
 * u_t = (t − ½)/T. Where a contrast rests on companies that are there for a short time only, most of that path has
 * nothing to tell of it, and the cosines are hardly different from each other where it has. They then run with its own
 * rows: u_t = (Σ_{s<t} v_s + v_t/2) / Σ v with v_t = Σ_i (w_i/T_i)²·[company i has a row in year t], the share of the
 * contrast's variance that lies before the middle of year t. On a clock of m rows no more than m − 1 cosines differ
 * from zero; B is limited to as many, m being the rows of the short company that carries most, and where they are fewer
 * than 3 the calendar stays.
 *
 * @param cosines  B that is wanted.
 * @returns B arrays of T numbers.
 * @see Cavaliere & Taylor (2007), Journal of Econometrics 140, 919–947, and (2008), Econometric Theory 24, 43–71, for
 *   the change of time by the variance profile.
 */
export function contrastCosines(
  sample: PanelSample,
  contrast: Contrast,
  cosines: number,
): Float64Array[] {
  const own = ownClock(sample, contrast);
  return own === null
    ? cosineWeights(calendar(sample.years.length), cosines)
    : cosineWeights(own.places, Math.min(cosines, own.mostCosines));
}

/** u_t = (t − ½)/T. */
export function calendar(years: number): Float64Array {
  return Float64Array.from({ length: years }, (_, position) => (position + 0.5) / years);
}

/** A clock that the contrast's own rows drive. */
export interface OwnClock {
  /** u_t, one a year of the sample. */
  readonly places: Float64Array;
  readonly mostCosines: number;
}

/** The clock of a contrast's own rows, null where it runs by the calendar. No scale of the weights changes it. */
export function ownClock(sample: PanelSample, contrast: Contrast): OwnClock | null {
  const { starts, position, years } = sample;
  const rowsOf = (company: number): number => starts[company + 1] - starts[company];
  let all = 0;
  let ofShort = 0;
  let largest = 0;
  let rows = 0;
  contrast.companies.forEach((company, index) => {
    const count = rowsOf(company);
    const variance = contrast.weights[index] ** 2 / count;
    all += variance;
    if (count >= shortShare * years.length) return;
    ofShort += variance;
    if (variance <= largest) return;
    largest = variance;
    rows = count;
  });
  if (rows <= fewestCosines || ofShort < restingShare * all) return null;
  const profile = new Float64Array(years.length);
  contrast.companies.forEach((company, index) => {
    const share = (contrast.weights[index] / rowsOf(company)) ** 2;
    for (let row = starts[company]; row < starts[company + 1]; row += 1) {
      profile[position[row]] += share;
    }
  });
  return { places: middleShares(profile), mostCosines: rows - 1 };
}

/** (Σ_{s<t} v_s + v_t/2) / Σ v. */
function middleShares(profile: Float64Array): Float64Array {
  const total = profile.reduce((sum, value) => sum + value, 0);
  let before = 0;
  return profile.map((value) => {
    const middle = (before + value / 2) / total;
    before += value;
    return middle;
  });
}
