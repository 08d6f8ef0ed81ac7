import type { PlanOutlook } from '@contract';
import type { ExpectedValue, FamiliarRange, PredictionBasis } from '@prediction';
import { type Bounded, asDifference, differenceKind } from '../../ui/model-form';
import type { NumberFormat } from '../../ui/number-format';
import { confidenceText, listed, sentence } from '../../ui/phrases';
import type { ReadYear } from '../../ui/plan/read-plan';

/** What an expected value is in a form and from a start: in log form the mean or, where the gap is carried, the median. */
export function expectedWords(
  form: PredictionBasis['form'],
  { start }: Pick<PlanOutlook, 'start'>,
): string {
  if (form !== 'log') return 'expected value';
  return start === 'carry-the-gap' ? 'expected value, median' : 'expected value, mean';
}

/** `+285 (100 to 470)`, of two logs `+3.2 % (1.1 to 5.4 %)`. */
export function differenceWords(
  value: Bounded,
  form: PredictionBasis['form'],
  numbers: NumberFormat,
): string {
  const shown = asDifference(value, form);
  const sign = shown.estimate > 0 ? '+' : '';
  return sign + numbers.interval(shown, differenceKind(form), 3);
}

const remarks: Readonly<Record<FamiliarRange['kind'], string>> = {
  inside: '',
  edge: 'at the edge of the familiar range',
  outside: 'outside the familiar range',
};

/** Where a plan leaves the familiar range, in words; empty inside. */
export function familiarRemark(kind: FamiliarRange['kind']): string {
  return remarks[kind];
}

/** What the band is called beside it. */
export function bandName({ bandConfidence }: Pick<PlanOutlook, 'bandConfidence'>): string {
  return `${confidenceText(bandConfidence)} band of the market value`;
}

/** Why years have no band, each reason once with its years; empty where all have one. */
export function noBandWords(
  years: readonly Pick<ReadYear, 'year' | 'band'>[],
  outlook: Pick<PlanOutlook, 'bandConfidence'>,
): string {
  const reasons = new Map<string, number[]>();
  for (const { year, band } of years)
    if (band.low === null)
      reasons.set(band.bandReason, [...(reasons.get(band.bandReason) ?? []), year]);
  return [...reasons]
    .map(([reason, without]) => {
      const where =
        without.length === years.length ? '' : ` in ${listed(without.map((year) => `FY${year}`))}`;
      return sentence(`No ${bandName(outlook)}${where}: ${reason}`);
    })
    .join(' ');
}

/** The figure of an expected value in the panel's unit with its interval, as a layout takes it. */
export function boundsOf({ estimate, low, high, intervalReason }: ExpectedValue): Bounded {
  return { estimate, low, high, ...(intervalReason === undefined ? {} : { intervalReason }) };
}
