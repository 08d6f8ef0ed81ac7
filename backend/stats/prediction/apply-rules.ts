import { heldRegressors } from './plan-regressors';
import { type PlanMove, type PlanRule, type RuleGround, ruleReason, totalShare } from './plan-rule';
import type { PredictionBasis } from './prediction-basis';

export interface RuleRequest {
  /** The planned calendar years, ascending. */
  readonly years: readonly number[];
  /** One a regressor; null where its values are typed. */
  readonly rules: readonly (PlanRule | null)[];
  /** Years × regressors, in the panel's measure; read where there is no rule. Null for an empty cell. */
  readonly typed: readonly (readonly (number | null)[])[];
  /** On top of rules and typed values alike. */
  readonly moves?: readonly PlanMove[];
}

/** Why a regressor has no value: in that year, or in none where `year` is null. */
export interface RuleReason {
  readonly regressor: number;
  readonly year: number | null;
  readonly reason: string;
}

export interface RuledPlan {
  /** Years × regressors, in the panel's measure; null where a reason says why. */
  readonly values: readonly (readonly (number | null)[])[];
  readonly reasons: readonly RuleReason[];
}

type Column = readonly (number | null)[];

/** What columns are filled from, those that others are shares of among them. */
interface Filling extends RuleRequest {
  readonly ground: RuleGround;
  readonly columns: readonly Column[];
}

/**
 * The values that rules, typed values and moves make: rule (or typed value) of the year + Σ moves up to that year. A move
 * is added after the rule: it neither grows with it nor counts towards a total. A share is of the other's value with its
 * moves.
 */
export function applyRules(
  basis: Pick<PredictionBasis, 'regressors' | 'form' | 'held' | 'last'>,
  request: RuleRequest,
): RuledPlan {
  const { years, rules } = request;
  const ground: RuleGround = {
    names: basis.regressors,
    last: heldRegressors(basis),
    lastYear: basis.last.year,
  };
  const columns: Column[] = [];
  const reasons: RuleReason[] = [];
  const filling: Filling = { ...request, ground, columns };
  for (const regressor of sourcesFirst(rules, ground.names.length)) {
    const reason = columnReason(filling, regressor);
    if (reason !== undefined) reasons.push({ regressor, year: null, reason });
    columns[regressor] = years.map((year, place) => {
      if (reason !== undefined) return null;
      const value = plannedValue(filling, regressor, place);
      const refusal = valueReason(basis, { regressor, value, rule: rules[regressor] ?? null });
      if (refusal === undefined) return value;
      reasons.push({ regressor, year, reason: refusal });
      return null;
    });
  }
  return {
    values: years.map((_, place) => columns.map((column) => column[place])),
    reasons: reasons.toSorted((left, right) => left.regressor - right.regressor),
  };
}

/** All regressors, each after the one it is a share of; those in a circle last. */
function sourcesFirst(rules: readonly (PlanRule | null)[], count: number): number[] {
  const depths = Array.from({ length: count }, (_, index) => chainOf(rules, index, count).length);
  return Array.from(depths.keys()).sort((left, right) => depths[left] - depths[right]);
}

/** What a regressor is a share of, what that is a share of, and so on: as many steps as there are regressors at most. */
function chainOf(rules: readonly (PlanRule | null)[], index: number, count: number): number[] {
  const chain: number[] = [];
  let rule = rules[index] ?? null;
  while (rule?.kind === 'share' && chain.length < count) {
    chain.push(rule.of);
    rule = rules[rule.of] ?? null;
  }
  return chain;
}

/** Rule or typed value with the moves up to that year; null where there is none to move. */
function plannedValue(filling: Filling, regressor: number, place: number): number | null {
  const { years, moves = [] } = filling;
  const value = ruledValue(filling, regressor, place);
  if (value === null) return null;
  return moves.reduce(
    (sum, move) =>
      move.regressor === regressor && move.year <= years[place] ? sum + move.amount : sum,
    value,
  );
}

function ruledValue(
  { years, rules, typed, ground, columns }: Filling,
  regressor: number,
  place: number,
): number | null {
  const rule = rules[regressor] ?? null;
  const last = ground.last[regressor];
  switch (rule?.kind) {
    case undefined: {
      const value = typed[place]?.[regressor] ?? null;
      return value !== null && Number.isFinite(value) ? value : null;
    }
    case 'hold':
      return last;
    case 'grow':
      return last * (1 + rule.percent / 100) ** (years[place] - ground.lastYear);
    case 'total':
      return rule.total * totalShare(rule.spread, place + 1, years.length);
    case 'share': {
      const source = columns[rule.of][place];
      return source === null ? null : (source * rule.percent) / 100;
    }
  }
}

/** Why a regressor has no value in any year; undefined where it may have some. */
function columnReason(
  { years, rules, moves = [], ground, columns }: Filling,
  regressor: number,
): string | undefined {
  const { names } = ground;
  const name = names[regressor];
  const rule = rules[regressor] ?? null;
  const reason = rule === null ? undefined : ruleReason(rule, regressor, ground);
  if (reason !== undefined) return reason;
  if (rule?.kind === 'share') {
    if (rule.of === regressor) return `${name} cannot be a share of itself.`;
    if (chainOf(rules, regressor, names.length).includes(regressor)) {
      return `${name} is a share of what is a share of it: give one of them another rule.`;
    }
    if (columns[rule.of].every((value) => value === null)) return sourceReason(names, name, rule);
  }
  const mine = moves.filter((move) => move.regressor === regressor);
  const stray = mine.find(({ year }) => !years.includes(year));
  if (stray !== undefined) return `FY${stray.year} is no year of the plan, so nothing moves in it.`;
  const empty = mine.find(({ amount }) => !Number.isFinite(amount));
  return empty && `No amount is given for the move of ${name} in FY${empty.year}.`;
}

function sourceReason(
  names: readonly string[],
  name: string,
  { of }: Extract<PlanRule, { kind: 'share' }>,
): string {
  return `${names[of]}, which ${name} is a share of, has no value.`;
}

/** Why a value cannot be planned; undefined where it can. */
function valueReason(
  { regressors, form }: Pick<PredictionBasis, 'regressors' | 'form'>,
  {
    regressor,
    value,
    rule,
  }: {
    readonly regressor: number;
    readonly value: number | null;
    readonly rule: PlanRule | null;
  },
): string | undefined {
  const name = regressors[regressor];
  if (value === null) {
    return rule?.kind === 'share'
      ? sourceReason(regressors, name, rule)
      : `No value is given for ${name}.`;
  }
  if (!Number.isFinite(value)) return `${name} is beyond what a number can hold.`;
  return form === 'log' && !(value > 0)
    ? `The log form needs values above zero; ${name} is not.`
    : undefined;
}
