import { type CoveragePromise, lowestShare, promises, promisesFor } from './promises';
import type { Setting } from './setting';
import { type Coverage, coverageOf, type Tallies } from './tally';

/** What one setting's replications counted. */
export interface SettingResult {
  readonly setting: Setting;
  readonly tallies: Tallies;
}

/** A default interval below the lowest share, promised or not. */
export interface Shortfall {
  readonly setting: Setting;
  readonly measure: string;
  readonly coverage: Coverage;
  /** Promises that it breaks; none outside of what the methods promise. */
  readonly broken: readonly CoveragePromise[];
}

/** Every default interval that holds the truth less often than the lowest share, in the order of settings. */
export function shortfallsOf(results: readonly SettingResult[]): Shortfall[] {
  const measures = [...new Set(promises.flatMap((promise) => promise.measures))];
  return results.flatMap(({ setting, tallies }) =>
    measures.flatMap((measure): Shortfall[] => {
      const coverage = coverageOf(tallies, measure);
      const broken = promisesFor(setting, measure);
      // A promised interval that is never given has not been kept either.
      if (coverage === null) return broken.length === 0 ? [] : [missing(setting, measure, broken)];
      return coverage.share < lowestShare ? [{ setting, measure, coverage, broken }] : [];
    }),
  );
}

function missing(setting: Setting, measure: string, broken: readonly CoveragePromise[]): Shortfall {
  const coverage = { share: 0, standardError: 0, meanLength: 0, given: 0 };
  return { setting, measure, coverage, broken };
}

/** Whether the report has to fail. */
export function breaksPromise(results: readonly SettingResult[]): boolean {
  return shortfallsOf(results).some(({ broken }) => broken.length > 0);
}
