import type { ExpectedPathChoice } from '@figures';
import {
  type Outlook,
  type PredictionBasis,
  expectedValue,
  familiarRange,
  heldRegressors,
} from '@prediction';
import type { PlanTablePlan, PlannedFigureWanted } from './plan-table';

/**
 * The planned figure behind a point of the expected path: of the plan that was chosen, or of the base, which plans the
 * last actual values, in the outlook given. Undefined for a year that happened, and for one that the plan does not have.
 */
export function chosenFigure(
  basis: PredictionBasis,
  plans: readonly PlanTablePlan[],
  choice: ExpectedPathChoice,
  outlook?: Pick<Outlook, 'start' | 'yearEffect'>,
): PlannedFigureWanted | undefined {
  if (choice.kind === 'actual') return undefined;
  const plan =
    choice.kind === 'base'
      ? basePlan(basis, { ...outlook, year: choice.year })
      : plans.at(choice.plan);
  const year = plan?.years.find((candidate) => candidate.year === choice.year);
  return plan === undefined || year === undefined ? undefined : { plan, year, kind: 'expected' };
}

function basePlan(
  basis: PredictionBasis,
  outlook: Outlook & { readonly year: number },
): PlanTablePlan {
  const values = heldRegressors(basis);
  const { year } = outlook;
  const expected = expectedValue(basis, values, outlook);
  const difference = { estimate: 0, standardError: 0, low: 0, high: 0 };
  const familiar = familiarRange(basis, values).kind;
  return { name: 'Base', years: [{ year, values, expected, difference, familiar }] };
}
