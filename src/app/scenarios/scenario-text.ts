import type { PlanYear, SaveScenario, ScenarioReply } from '@contract';
import { type AskedPlan, heldAsked, isSameAsked, usualOutlook } from '../ui/plan/asked-plan';
import type { PlanTablePlan } from '../ui/plan/plan-table';
import type { PlannedYear } from '../ui/plan/read-plan';
import type { Draft } from './draft-keeper';
import type { ScenarioGround } from './scenario-ground';

/** A plan as it stands on the page, saved or not. */
export interface ScenarioText extends AskedPlan {
  readonly name: string;
  readonly note: string;
}

/** What the server is sent of it. */
export type StoredText = Omit<SaveScenario, 'fitId' | 'keepsDraft'>;

/** Nothing on the page yet. */
export const noText: ScenarioText = {
  name: '',
  note: '',
  plan: [],
  outlook: usualOutlook({ confidence: 0.95 }),
  rules: [],
  uncertainty: null,
};
const firstYears = 3;
const longestName = 120;

/** What the page begins with: the scenario as it is stored, or the base without a name. */
export function storedText({ saved, basis }: ScenarioGround): ScenarioText {
  return saved === null ? { name: '', note: '', ...heldAsked(basis, firstYears) } : toText(saved);
}

export function toText(source: ScenarioText): ScenarioText {
  const { name, note, plan, outlook, rules, uncertainty } = source;
  return { name, note, plan, outlook, rules, uncertainty };
}

export function toStoredText(text: ScenarioText): StoredText {
  const { name, note, plan, outlook, rules, uncertainty } = text;
  return { name, note, plan: toStoredPlan(plan), outlook, rules: [...rules], uncertainty };
}

/** A stored scenario as a plan with its figures. */
export function storedFigures({ name, plan, years }: ScenarioReply): PlanTablePlan {
  return { name, years: years.map((year, index) => ({ ...year, values: plan[index].values })) };
}

/** The text as the draft of what it was written on. */
export function draftOf({ fit, saved }: ScenarioGround, text: ScenarioText): Draft {
  return { fitId: fit.fit.id, body: { scenarioId: saved?.id ?? null, ...toStoredText(text) } };
}

function toStoredPlan(plan: readonly PlannedYear[]): PlanYear[] {
  return plan.map(({ year, values }) => ({ year, values: [...values] }));
}

export function isSameText(left: ScenarioText, right: ScenarioText): boolean {
  return left.name === right.name && left.note === right.note && isSameAsked(left, right);
}

export function copyName(name: string): string {
  return `${name.slice(0, longestName - 7)} (copy)`;
}

/** The list with this scenario in its place, or at its end. */
export function withScenario(
  scenarios: readonly ScenarioReply[],
  scenario: ScenarioReply,
): readonly ScenarioReply[] {
  return scenarios.some(({ id }) => id === scenario.id)
    ? scenarios.map((other) => (other.id === scenario.id ? scenario : other))
    : [...scenarios, scenario];
}
