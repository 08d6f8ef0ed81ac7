import type { ModelForm } from '@contract';
import { asDifference } from '../ui/model-form';
import type { PlannedFigureWanted, PlanTablePlan } from '../ui/plan/plan-table';

/**
 * The plan's figure that a sentence writes, by its key (`expected.2026`, `difference.2026`) and by the number written,
 * since plans share their years. Undefined where it is no plan's figure.
 */
export function plannedIn(
  plans: readonly PlanTablePlan[],
  key: string,
  value: number,
  form: ModelForm,
): PlannedFigureWanted | undefined {
  const [kind, year] = key.split('.');
  if (kind !== 'expected' && kind !== 'difference') return undefined;
  const found = plans.flatMap((plan) =>
    plan.years
      .filter((planned) => planned.year === Number(year))
      .map((planned): PlannedFigureWanted => ({ plan, year: planned, kind })),
  );
  const shown = ({ year: planned }: PlannedFigureWanted) =>
    kind === 'expected' ? planned.expected : asDifference(planned.difference, form);
  return (
    found.find((each) => {
      const { estimate, low, high } = shown(each);
      return [estimate, low, high].includes(value);
    }) ?? found.at(0)
  );
}
