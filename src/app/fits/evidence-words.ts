import type { FitResult } from '@contract';
import { asDifference, differenceKind } from '../ui/model-form';
import type { NumberFormat } from '../ui/number-format';
import type { Remark } from '../ui/remark-list';

/** What the test of company levels sets them against, and what it takes for granted. */
export function poolabilityCaution({ specification }: Pick<FitResult, 'specification'>): string {
  const against =
    specification.effects === 'company,year'
      ? 'Company levels beside year effects, against year effects alone. '
      : '';
  return `${against}The test assumes errors that do not persist from year to year.`;
}

/** Title of the gap path: its course in words. */
export function driftFinding(
  { drift, specification }: Pick<FitResult, 'drift' | 'specification'>,
  ownCompany: string,
  numbers: NumberFormat,
): string {
  const { form } = specification;
  if (drift?.low == null || drift.high === null)
    return `The gap of ${ownCompany} to its peers, year by year`;
  const { estimate } = asDifference(drift, form);
  const size = numbers.headline(Math.abs(estimate), differenceKind(form));
  if (drift.low > 0) return `${ownCompany} has gained on its peers by ${size} a year`;
  if (drift.high < 0) return `${ownCompany} has lost ground to its peers by ${size} a year`;
  return 'No clear drift in the gap to peers';
}

/** The engine's warnings in its own words; and in order to be said, that there is none. */
export function warningRemarks({ warnings }: Pick<FitResult, 'warnings'>): readonly Remark[] {
  if (warnings.length === 0)
    return [
      {
        kind: 'fine',
        text: 'Nothing found that weakens these figures: enough companies and years, and no single company decides the result.',
      },
    ];
  return warnings.map(({ detail }) => ({ kind: 'caution', text: detail }));
}
