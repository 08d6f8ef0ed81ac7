import type { PlanMove, PlanRule } from '@contract';
import { type PredictionBasis, heldRegressors } from '@prediction';
import type { FigureKind, NumberFormat } from '../number-format';
import { yearsText } from '../phrases';
import { regressorKind } from './regressor-labels';

export interface RuledRegressor {
  readonly basis: Pick<PredictionBasis, 'held' | 'last'>;
  readonly labels: readonly string[];
  readonly regressor: number;
  /** First and last planned year. */
  readonly years: readonly [number, number];
}

/** A rule in words, as they follow the regressor's name: `grows 5 % a year from FY2025’s 412`. */
export function ruleWords(
  rule: PlanRule | null,
  { basis, labels, regressor, years }: RuledRegressor,
  numbers: Pick<NumberFormat, 'shown'>,
): string {
  const kind = regressorKind(regressor);
  const last = `FY${basis.last.year}’s ${amountText(heldRegressors(basis)[regressor], kind, numbers)}`;
  switch (rule?.kind) {
    case undefined:
      return 'is entered year by year';
    case 'hold':
      return `holds ${last}`;
    case 'grow':
      return `${rule.percent < 0 ? 'shrinks' : 'grows'} ${percentText(Math.abs(rule.percent))} a year from ${last}`;
    case 'total':
      return `comes to ${amountText(rule.total, kind, numbers)} over ${yearsText(...years)}, ${spreads[rule.spread]}`;
    case 'share':
      return `is ${percentText(rule.percent)} of ${labels[rule.of]} of the same year`;
  }
}

export const spreads = {
  even: 'spread evenly',
  rising: 'more every year',
  falling: 'less every year',
} as const;

/** `Equity raise of 100 in FY2027`, for book equity; of another regressor what it does to the level. */
export function moveWords(
  { year, amount }: PlanMove,
  regressor: number,
  numbers: Pick<NumberFormat, 'shown'>,
): string {
  const size = amountText(Math.abs(amount), regressorKind(regressor), numbers);
  if (isBookEquity(regressor))
    return `${amount < 0 ? 'Buyback' : 'Equity raise'} of ${size} in FY${year}`;
  return `${amount < 0 ? 'Lower' : 'Higher'} by ${size} from FY${year} on`;
}

/** Equity raises and buybacks move book equity, the second regressor of every fit that has one. */
export function isBookEquity(regressor: number): boolean {
  return regressor === 1;
}

/** As it was entered, in the unit shown, without the noise of changing units. */
function amountText(value: number, kind: FigureKind, numbers: Pick<NumberFormat, 'shown'>): string {
  const shown = Number(numbers.shown(value, kind).toPrecision(12));
  return shown.toLocaleString('en', { maximumFractionDigits: 12 }).replace('-', '−');
}

function percentText(percent: number): string {
  return `${Number(percent.toPrecision(6)).toLocaleString('en', { maximumFractionDigits: 6 })} %`;
}
