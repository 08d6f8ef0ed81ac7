import type { FitResult } from '@contract';
import { asDifference, differenceKind } from '../../ui/model-form';
import { type NumberFormat, headlineDigits } from '../../ui/number-format';
import { sentence } from '../../ui/phrases';
import { pText } from '../fit-words';

/** Whether the gap drifts, by its test: then one standing for all years hides where the company stands now. */
export function driftMeaning(
  { drift, driftReason, specification }: Pick<FitResult, 'drift' | 'driftReason' | 'specification'>,
  numbers: NumberFormat,
): string {
  if (drift === null) return driftReason ?? 'There is no gap path, so no drift to test.';
  const kind = differenceKind(specification.form);
  const figure = numbers.interval(asDifference(drift, specification.form), kind, headlineDigits);
  const unit = kind === 'money' ? ` ${numbers.unitLabel()}` : '';
  const head = `The gap moves by ${figure}${unit} a year, ${pText(drift.pValue)}`;
  if (drift.pValue === null)
    return `${head}: ${sentence(drift.intervalReason ?? 'its test has no p value')}`;
  return drift.pValue < 1 - specification.confidence
    ? `${head}: it drifts, so one standing for all years hides where it is now.`
    : `${head}: no drift is shown, so one standing is kept for all years.`;
}
