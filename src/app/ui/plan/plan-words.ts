import type { PlanOutlook } from '@contract';
import type { FamiliarRange, IntervalEstimate, PredictionBasis } from '@prediction';
import { type Bounded, asDifference, differenceKind } from '../model-form';
import type { FigureKind, NumberFormat } from '../number-format';
import { lagText, listed } from '../phrases';
import { regressorKind } from './regressor-labels';

/** The year that a plan is judged by: the last one that differs from the base, or else its last. */
export function decidingYear<T extends { readonly difference: IntervalEstimate }>(
  years: readonly T[],
): T | undefined {
  return years.findLast(({ difference }) => difference.estimate !== 0) ?? years.at(-1);
}

/**
 * A plan's finding: `Build-out lifts the expected value of Velmara by 285 (100 to 470) by FY2028`, in log form by
 * `3.2 % (1.1 to 5.4 %)`. Where the interval holds zero the sentence says `may`.
 */
export function planFinding(
  plan: string,
  { company, form }: Pick<PredictionBasis, 'company' | 'form'>,
  last: { readonly year: number; readonly difference: IntervalEstimate },
  numbers: NumberFormat,
): string {
  const { year } = last;
  if (last.difference.estimate === 0)
    return `${plan} leaves the expected value of ${company} where the base has it in FY${year}`;
  const difference = asDifference(last.difference, form);
  const isLower = difference.estimate < 0;
  const size = isLower ? turned(difference) : difference;
  const isCertain = size.low !== null && size.low > 0;
  const verb = isLower ? 'lower' : 'lift';
  const says = isCertain ? `${verb}s` : `may ${verb}`;
  return `${plan} ${says} the expected value of ${company} by ${numbers.interval(size, differenceKind(form), 3)} by FY${year}`;
}

const places: Readonly<Record<FamiliarRange['kind'], string>> = {
  inside: 'inside the familiar range',
  edge: 'at the edge of the familiar range',
  outside: 'outside the familiar range',
};

/** The header over expected values: in log form which of the two it is. */
export function expectedName(form: PredictionBasis['form']): string {
  return form === 'log' ? 'Expected value, mean' : 'Expected value';
}

/** What the model assumes of a plan beyond its amounts, a sentence each. */
export function planAssumptions(
  basis: PredictionBasis,
  years: number,
  outlook?: Pick<PlanOutlook, 'start' | 'yearEffect'>,
): readonly string[] {
  const { last, yearEffects } = basis;
  const first = last.year + 1;
  const lastPlanned = last.year + years;
  return [
    ...(basis.lag === 1
      ? [
          `This fit reads regressors${lagText(basis.lag)}: this year’s plan acts next year. FY${first} reads FY${last.year} as it was; the plan of FY${lastPlanned} acts in FY${lastPlanned + 1}, which is not shown.`,
        ]
      : []),
    ...(yearEffects === undefined || yearEffects === null
      ? []
      : [
          `Year effect of every planned year: ${yearEffectSource(yearEffects.lastYear, outlook?.yearEffect)}.`,
        ]),
    ...(basis.form === 'log'
      ? [
          `This fit reads logs: expected values are ${outlook?.start === 'carry-the-gap' ? 'medians' : 'means'}, brought back to amounts; differences are percentages. Every amount has to be above zero.`,
        ]
      : []),
  ];
}

function yearEffectSource(lastYear: number, chosen: PlanOutlook['yearEffect'] = 'last'): string {
  if (typeof chosen === 'object') return 'a given one, taken as known';
  return chosen === 'last'
    ? `that of FY${lastYear}, the last observed`
    : 'the mean of the last three observed';
}

/** `FY2027 and FY2028 are at the edge of the familiar range`. */
export function familiarFinding(years: readonly number[], kind: FamiliarRange['kind']): string {
  const named = listed(years.map((year) => `FY${year}`));
  return `${named} ${years.length === 1 ? 'is' : 'are'} ${places[kind]}`;
}

/** Why a planned year lies where it does: as a whole, then value by value against what was observed. */
export function familiarReason(
  basis: PredictionBasis,
  labels: readonly string[],
  familiar: FamiliarRange,
  numbers: NumberFormat,
): string {
  const { company } = basis;
  const whole = {
    inside: `${company} itself has been as far from its own average in a past year.`,
    edge: `It lies further from ${company}’s own average than ${company} has ever been; a peer has been as far from its own.`,
    outside: `It lies further from ${company}’s own average than any company of the group has been from its own, so the model has nothing to judge it by.`,
  }[familiar.kind];
  const odd = familiar.reasons.flatMap((reason, k) => {
    if (reason.own === 'within') return [];
    const kind = regressorKind(k);
    const planned = numbers.figure(reason.planned, kind);
    return [
      `${capitalised(labels[k])} ${planned} is ${reason.own} ${company}’s own range (${rangeText(basis.ownRange[k], kind, numbers)}) and ${reason.peers} its peers’ (${rangeText(basis.peerRange[k], kind, numbers)}).`,
    ];
  });
  if (odd.length > 0) return `${whole} ${odd.join(' ')}`;
  const together =
    labels.length > 1 && familiar.kind !== 'inside'
      ? ` Each value alone has been seen; ${listed(labels)} together have not.`
      : '';
  return whole + together;
}

function rangeText(
  range: { readonly low: number; readonly high: number },
  kind: FigureKind,
  numbers: NumberFormat,
): string {
  const digits = numbers.columnDigits([range.low, range.high], kind);
  return numbers.bounds({ estimate: range.high, ...range }, kind, digits);
}

function turned({ estimate, low, high }: Bounded): Bounded {
  return {
    estimate: -estimate,
    low: high === null ? null : -high,
    high: low === null ? null : -low,
  };
}

export function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
