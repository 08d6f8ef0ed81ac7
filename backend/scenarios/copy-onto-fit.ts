import { Invalid } from '../errors/app-error';
import { carryingReason, heldRegressors, type PredictionBasis } from '../stats/prediction';
import type { PlannedYear } from './evaluate-plan';
import { type PlanReading, typedByHand } from './plan-reading';
import { isSameAmount, ruleValues } from './rule-values';
import type { PlanOutlookChoice, PlanUncertaintyRanges, RegressorRule } from './plan-types';

/** What a copy could not take over as it was. */
export interface CopyChanges {
  readonly droppedYears: readonly number[];
  readonly addedYears: readonly number[];
  readonly heldRegressors: readonly string[];
  readonly droppedRegressors: readonly string[];
  readonly droppedRules: readonly string[];
  /** In words. */
  readonly outlook: readonly string[];
}

export interface CopiedPlan {
  readonly reading: PlanReading;
  readonly changes: CopyChanges;
}

const mostYears = 5;

/**
 * A plan as another fit reads it. Amounts stay as they were planned, matched by the regressor's name; years that the
 * new fit has observed go; years that it lacks before the first kept one hold the last observed values; a regressor
 * that the plan never had is held. A rule stays where it gives the same amounts on the new fit.
 *
 * @throws {Invalid} where every planned year is observed by now, or the plan lies too far ahead to be joined on.
 */
export function copyOntoFit(
  source: PlanReading,
  from: PredictionBasis,
  onto: PredictionBasis,
): CopiedPlan {
  const first = onto.last.year + 1;
  const kept = source.plan.filter(({ year }) => year >= first);
  if (kept.length === 0)
    throw new Invalid(
      `Every planned year is observed by now: the fit’s last year of ${onto.company} is ${onto.last.year}. Start a new plan on it.`,
    );
  const years = range(first, kept[kept.length - 1].year);
  if (years.length > mostYears)
    throw new Invalid(
      `The plan ends in ${kept[kept.length - 1].year}, ${years.length} years after ${onto.last.year}, the fit’s last year; a plan has at most ${mostYears}.`,
    );
  const places = onto.regressors.map((name) => from.regressors.indexOf(name));
  const held = heldRegressors(onto);
  const plan = years.map((year): PlannedYear => {
    const planned = kept.find((each) => each.year === year);
    const values = places.map((place, k) =>
      planned === undefined || place === -1 ? held[k] : planned.values[place],
    );
    return { year, values };
  });
  const { rules, droppedRules } = rulesThatHold(source, onto, places, plan);
  const { outlook, outlookWords } = outlookThatHolds(source.outlook, onto);
  return {
    reading: { plan, outlook, rules, uncertainty: rangesOf(source, places, years) },
    changes: {
      droppedYears: source.plan.map(({ year }) => year).filter((year) => year < first),
      addedYears: years.filter((year) => !kept.some((each) => each.year === year)),
      heldRegressors: onto.regressors.filter((_, k) => places[k] === -1),
      droppedRegressors: from.regressors.filter((name) => !onto.regressors.includes(name)),
      droppedRules,
      outlook: outlookWords,
    },
  };
}

function rulesThatHold(
  source: PlanReading,
  onto: PredictionBasis,
  places: readonly number[],
  plan: readonly PlannedYear[],
): { readonly rules: readonly RegressorRule[]; readonly droppedRules: readonly string[] } {
  const droppedRules: string[] = [];
  const rules = places.map((place, k): RegressorRule => {
    const rule = place === -1 ? typedByHand : source.rules[place];
    if (rule.rule === null && rule.moves.length === 0) return typedByHand;
    const moved = withPlaces(rule, places);
    if (moved !== null && givesPlan(moved, k, onto, plan)) return moved;
    droppedRules.push(onto.regressors[k]);
    return typedByHand;
  });
  return { rules, droppedRules };
}

/** Whether a rule of one regressor, the others as planned, gives its planned amounts. */
function givesPlan(
  rule: RegressorRule,
  regressor: number,
  onto: PredictionBasis,
  plan: readonly PlannedYear[],
): boolean {
  const years = plan.map(({ year }) => year);
  if (rule.moves.some(({ year }) => !years.includes(year))) return false;
  const alone = onto.regressors.map((_, k) => (k === regressor ? rule : typedByHand));
  const ruled = ruleValues(onto, plan, alone);
  return (
    ruled.kind === 'given' &&
    plan.every(({ values }, index) => {
      const given = ruled.values[index][regressor];
      return given === null || isSameAmount(values[regressor], given);
    })
  );
}

/** The rule with the place of the regressor that it is a share of; null where the new fit does not have that one. */
function withPlaces(rule: RegressorRule, places: readonly number[]): RegressorRule | null {
  if (rule.rule?.kind !== 'share') return rule;
  const of = places.indexOf(rule.rule.of);
  return of === -1 ? null : { ...rule, rule: { ...rule.rule, of } };
}

function rangesOf(
  { plan, uncertainty }: PlanReading,
  places: readonly number[],
  years: readonly number[],
): PlanUncertaintyRanges | null {
  if (uncertainty === null) return null;
  const ranges = years.map((year) => {
    const index = plan.findIndex((each) => each.year === year);
    return places.map((place) =>
      index === -1 || place === -1 ? null : uncertainty.ranges[index][place],
    );
  });
  return { seed: uncertainty.seed, ranges };
}

function outlookThatHolds(
  outlook: PlanOutlookChoice,
  onto: PredictionBasis,
): { readonly outlook: PlanOutlookChoice; readonly outlookWords: readonly string[] } {
  const reason = outlook.start === 'carry-the-gap' ? carryingReason(onto) : undefined;
  return reason === undefined
    ? { outlook, outlookWords: [] }
    : {
        outlook: { ...outlook, start: 'model-level' },
        outlookWords: [`It starts from the model level, for the gap cannot be carried: ${reason}`],
      };
}

function range(first: number, last: number): readonly number[] {
  return Array.from({ length: last - first + 1 }, (_, index) => first + index);
}
