import {
  expectedMeasures,
  nominal,
  rankSetMeasure,
  slopeMeasure,
  standingMeasure,
  valueMeasures,
} from './measures';
import type { Setting } from './setting';

/** Where the methods say that a default interval holds. */
export interface CoveragePromise {
  readonly name: string;
  readonly measures: readonly string[];
  /** The sentence of the methods that it rests on. */
  readonly sentence: string;
  /** Where it counts, in words, and as a rule. */
  readonly where: string;
  readonly covers: (setting: Setting) => boolean;
}

/** What the methods say of standings and rank sets was simulated with as many companies. */
export const statedCompanies = 12;

/** Below this share a promised interval at a nominal .95 has failed. */
export const lowestShare = 0.93;

export const promises: readonly CoveragePromise[] = [
  {
    name: 'slopes',
    measures: [slopeMeasure('cr2')],
    sentence: '§2: “with about 12 companies only `cr2` and `wild` are honest”',
    where:
      'everywhere but with shocks common to the regressors too and no year effects, which clustering by company rules out',
    covers: ({ commonShock, effects }) =>
      commonShock !== 'errors and regressors' || effects === 'company,year',
  },
  {
    name: 'standing and expected value',
    measures: [standingMeasure, ...expectedMeasures],
    sentence:
      '§3: “every linear contrast of the full regression’s coefficients that has company or year weights (an intercept, a standing, a difference of two, an expected value) gets this interval” and “Simulated coverage of the standing at nominal .95 (N = 12 …): ρ = 0, .5, .8 for all: .952, .972, .958 at T = 20 and .960, .960, .948 at T = 10; … sizes up to 20-fold: .954 and .957”; of common shocks, “which keeps shocks that hit all companies together”',
    where: `like persistence, all rows and no year effects, with ${statedCompanies} companies, as stated, or more; the own company of any size`,
    covers: hasStatedCompanies,
  },
  {
    name: 'standing, varied persistence',
    measures: [standingMeasure, ...expectedMeasures],
    sentence:
      '§3: “ρ_i uniform in (.2, .9): .957 and .927”: the second figure, at T = 10, lies below .93 as stated',
    where: 'T = 20',
    covers: ({ persistence, years }) => persistence.kind === 'varied' && years === 20,
  },
  {
    name: 'short own company',
    measures: [standingMeasure, ...expectedMeasures],
    sentence:
      '§3: “only the last 5 of 20 own rows present: .94 to .97”, of the standing; the expected value “gets this interval” too',
    where: 'the own company’s last 5 of 20 rows',
    covers: ({ rows }) => rows === 'last 5 of the own',
  },
  {
    name: 'rank sets',
    measures: [rankSetMeasure],
    sentence:
      '§3: “simulated family-wise error under ties .03 to .05 with like persistence, .08 when it varies, .13 at the weak point”',
    where: `like persistence, all rows and no year effects, with ${statedCompanies} companies or more`,
    covers: hasStatedCompanies,
  },
  {
    name: 'market value',
    measures: valueMeasures(nominal),
    sentence:
      '§4: “Simulated coverage at nominal .95: .94 to .98 (h = 1, 3, 5; T = 10, 20; ρ = 0, .5, .8)”',
    where: 'like persistence, all rows and no year effects',
    covers: hasLikePersistenceAndAllRows,
  },
];

function hasStatedCompanies(setting: Setting): boolean {
  return hasLikePersistenceAndAllRows(setting) && setting.companies >= statedCompanies;
}

function hasLikePersistenceAndAllRows({ persistence, rows, effects }: Setting): boolean {
  return persistence.kind === 'like' && rows === 'all' && effects === 'company';
}

/** The promises that one measure is held to in one setting. */
export function promisesFor(setting: Setting, measure: string): readonly CoveragePromise[] {
  return promises.filter(({ measures, covers }) => measures.includes(measure) && covers(setting));
}
