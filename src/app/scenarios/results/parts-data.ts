import type { DifferenceData } from '@figures';
import type { PredictionBasis } from '@prediction';
import { levelKind, logUnit } from '../../ui/model-form';
import type { NumberFormat } from '../../ui/number-format';
import { differenceData } from '../../ui/plan/plan-data';
import type { ReadYear } from '../../ui/plan/read-plan';

type PartsBasis = Pick<PredictionBasis, 'form' | 'lag' | 'last'>;

/** Plan against base in one year: slopes times differences and nothing else. In log form in logs. */
export function partsToBase(
  year: ReadYear,
  labels: readonly string[],
  { lag }: PartsBasis,
): DifferenceData {
  return differenceData(year, labels, lag);
}

const takenAsItWas = 'what was observed is taken as it was';

/**
 * Plan against the last actual market value in one year: slopes times differences, the part of the gap that fades, the
 * year effect and in logs the smearing. The last actual value is a number: the total's interval is the expected value's.
 */
export function partsFromLast(
  year: ReadYear,
  labels: readonly string[],
  basis: PartsBasis,
): DifferenceData {
  const { fromLast, expected } = year;
  const slopes = differenceData(
    { ...year, parts: { terms: fromLast.terms, total: fromLast.total } },
    labels,
    basis.lag,
  ).terms;
  const fixed = { low: null, high: null, intervalReason: takenAsItWas };
  const { yearEffect, smearing, fadingGap } = fromLast;
  const inScale = expected.log?.inLogs ?? expected;
  const shift = fromLast.total - inScale.estimate;
  const move = (end: number | null): number | null => (end === null ? null : end + shift);
  return {
    terms: [
      ...slopes,
      { name: `Gap of FY${basis.last.year} that fades`, estimate: fadingGap, ...fixed },
      ...(yearEffect === null ? [] : [{ name: 'Year effect', ...yearEffect }]),
      ...(smearing === 0
        ? []
        : [{ name: 'Smearing, from median to mean', estimate: smearing, ...fixed }]),
    ],
    total: {
      estimate: fromLast.total,
      low: move(inScale.low),
      high: move(inScale.high),
      ...(inScale.intervalReason === undefined ? {} : { intervalReason: inScale.intervalReason }),
    },
  };
}

/** How much of the last gap is left in a year: `Of the gap of FY2025, +30, 49 % is left in FY2027`. */
export function gapWords(
  { year, fromLast }: Pick<ReadYear, 'year' | 'fromLast'>,
  { last, form }: PartsBasis,
  numbers: NumberFormat,
): string {
  if (last.residual === 0) return `FY${last.year} lay where the model has it: no gap fades.`;
  const sign = last.residual > 0 ? '+' : '';
  const gap = sign + numbers.headline(last.residual, levelKind(form));
  const unit = form === 'log' ? ` in ${logUnit}` : '';
  const left = 1 + fromLast.fadingGap / last.residual;
  const share = Math.abs(left) < 1e-12 ? 'nothing' : numbers.headline(left, 'percent');
  return `Of the gap of FY${last.year}, ${gap}${unit}, ${share} is left in FY${year}.`;
}
