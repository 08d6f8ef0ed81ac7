import { Invalid } from '../errors/app-error';
import { carryingReason, type PredictionBasis } from '../stats/prediction';
import type { PlannedYear } from './evaluate-plan';
import type { PlanReading } from './plan-reading';
import { isSameAmount, ruleValues } from './rule-values';

interface Fault {
  readonly pointer: string;
  readonly detail: string;
}

/**
 * Holds a plan to the fit it is read through.
 *
 * @throws {Invalid} with every fault and its place: years that do not follow the last observed one, a wrong number of
 *   values, amounts that the log form cannot read, a starting point the fit does not have, amounts that are not what
 *   their rule gives, and ranges that do not hold the planned amount.
 */
export function assertPlan(reading: PlanReading, basis: PredictionBasis): void {
  const shape = reading.plan.flatMap((planned, index) => yearFaults(planned, index, basis));
  const errors = shape.length > 0 ? shape : contentFaults(reading, basis);
  if (errors.length > 0) throw new Invalid('The plan does not fit the fit.', errors);
}

function yearFaults(
  { year, values }: PlannedYear,
  index: number,
  basis: PredictionBasis,
): readonly Fault[] {
  const expectedYear = basis.last.year + 1 + index;
  const found: Fault[] = [];
  if (year !== expectedYear)
    found.push({
      pointer: `/plan/${index}/year`,
      detail: `expected ${expectedYear}, the years after ${basis.last.year} in a row; found ${year}`,
    });
  if (values.length !== basis.regressors.length)
    found.push({
      pointer: `/plan/${index}/values`,
      detail: `expected ${basis.regressors.length} values, for ${basis.regressors.join(' and ')}; found ${values.length}`,
    });
  // Also of a last year that with a lag nothing reads yet.
  if (basis.form === 'log')
    values.forEach((value, regressor) => {
      if (!(value > 0))
        found.push({
          pointer: `/plan/${index}/values/${regressor}`,
          detail: `expected an amount above zero, for the fit reads logs; found ${value}`,
        });
    });
  return found;
}

function contentFaults(reading: PlanReading, basis: PredictionBasis): readonly Fault[] {
  return [
    ...outlookFaults(reading, basis),
    ...ruleFaults(reading, basis),
    ...rangeFaults(reading, basis),
  ];
}

function outlookFaults({ outlook }: PlanReading, basis: PredictionBasis): readonly Fault[] {
  const reason = outlook.start === 'carry-the-gap' ? carryingReason(basis) : undefined;
  return reason === undefined
    ? []
    : [{ pointer: '/outlook/start', detail: `the gap cannot be carried: ${reason}` }];
}

function ruleFaults({ plan, rules }: PlanReading, basis: PredictionBasis): readonly Fault[] {
  if (rules.length !== basis.regressors.length)
    return [
      {
        pointer: '/rules',
        detail: `expected ${basis.regressors.length} rules, one a regressor, or none; found ${rules.length}`,
      },
    ];
  const ruled = ruleValues(basis, plan, rules);
  if (ruled.kind === 'refused')
    return [{ pointer: `/rules/${ruled.regressor}`, detail: ruled.reason }];
  return plan.flatMap(({ year, values }, index) =>
    values.flatMap((value, regressor) => {
      const given = ruled.values[index][regressor];
      return given === null || isSameAmount(value, given)
        ? []
        : [
            {
              pointer: `/plan/${index}/values/${regressor}`,
              detail: `expected ${given}, which the rule of ${basis.regressors[regressor]} gives for ${year}; found ${value}`,
            },
          ];
    }),
  );
}

function rangeFaults({ plan, uncertainty }: PlanReading, basis: PredictionBasis): readonly Fault[] {
  if (uncertainty === null) return [];
  const { ranges } = uncertainty;
  if (ranges.length !== plan.length)
    return [
      {
        pointer: '/uncertainty/ranges',
        detail: `expected ${plan.length} years of ranges, as the plan has; found ${ranges.length}`,
      },
    ];
  return ranges.flatMap((ofYear, index) => {
    if (ofYear.length !== basis.regressors.length)
      return [
        {
          pointer: `/uncertainty/ranges/${index}`,
          detail: `expected ${basis.regressors.length} ranges, one a regressor; found ${ofYear.length}`,
        },
      ];
    return ofYear.flatMap((range, regressor): readonly Fault[] => {
      if (range === null) return [];
      const likely = plan[index].values[regressor];
      const pointer = `/uncertainty/ranges/${index}/${regressor}`;
      if (range.low > likely || range.high < likely)
        return [
          {
            pointer,
            detail: `expected a range that holds the planned ${likely}; found ${range.low} to ${range.high}`,
          },
        ];
      return basis.form === 'log' && !(range.low > 0)
        ? [{ pointer, detail: `expected amounts above zero, for the fit reads logs` }]
        : [];
    });
  });
}
