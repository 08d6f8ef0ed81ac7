import type { PlanUncertainty, RegressorPlan } from '@contract';
import type { PredictionBasis } from '@prediction';
import { filled, usualSeed } from '../ui/plan/change-asked';
import { type ScenarioText, toText } from './scenario-text';
import { isWhole, rangeOf } from './text-differences';

/**
 * One's own version with what was chosen of theirs in its place, by the keys of `textDifferences`. Where the rules of
 * both together give no plan, the amounts stay and the rules go.
 */
export function mergedTexts(
  basis: PredictionBasis,
  mine: ScenarioText,
  theirs: ScenarioText,
  fromTheirs: ReadonlySet<string>,
): ScenarioText {
  const of = (key: string): ScenarioText => (fromTheirs.has(key) ? theirs : mine);
  const ofRegressor = (k: number, year: number): ScenarioText =>
    of(isWhole(mine, theirs, k) ? `regressor ${k}` : `amount ${k} ${year}`);
  const plan = of('years').plan.map(({ year }) => ({
    year,
    values: basis.regressors.map((_, k) => amountOf(ofRegressor(k, year), [mine, theirs], year, k)),
  }));
  const merged: ScenarioText = {
    name: of('name').name,
    note: of('note').note,
    plan,
    outlook: {
      start: of('start').outlook.start,
      yearEffect: of('yearEffect').outlook.yearEffect,
      confidence: of('confidence').outlook.confidence,
      bandConfidence: of('bandConfidence').outlook.bandConfidence,
    },
    rules: basis.regressors.map((_, k) => withinPlan(of(`regressor ${k}`).rules[k], plan)),
    uncertainty: mergedRanges(plan, mine, theirs, of),
  };
  const change = filled(basis, merged);
  return change.kind === 'changed'
    ? toText({ ...merged, ...change.asked })
    : { ...merged, rules: merged.rules.map(({ moves }) => ({ rule: null, moves })) };
}

/** The amount of the version that was chosen, or of the other one where it does not have the year. */
function amountOf(
  chosen: ScenarioText,
  both: readonly ScenarioText[],
  year: number,
  k: number,
): number {
  const found = [chosen, ...both].flatMap(({ plan }) =>
    plan.filter((planned) => planned.year === year),
  );
  return found[0].values[k];
}

function withinPlan(rule: RegressorPlan, plan: ScenarioText['plan']): RegressorPlan {
  const last = plan[plan.length - 1].year;
  return { ...rule, moves: rule.moves.filter(({ year }) => year <= last) };
}

function mergedRanges(
  plan: ScenarioText['plan'],
  mine: ScenarioText,
  theirs: ScenarioText,
  of: (key: string) => ScenarioText,
): PlanUncertainty | null {
  if (mine.uncertainty === null && theirs.uncertainty === null) return null;
  const ranges = plan.map(({ year, values }) =>
    values.map((_, k) => rangeOf(of(`range ${k} ${year}`), year, k)),
  );
  const seed =
    of('seed').uncertainty?.seed ?? mine.uncertainty?.seed ?? theirs.uncertainty?.seed ?? usualSeed;
  return { seed, ranges };
}
