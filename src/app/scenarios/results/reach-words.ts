import type { FiellerRange, Reach } from '@prediction';
import type { NumberFormat } from '../../ui/number-format';
import { confidenceText, sentence } from '../../ui/phrases';
import { regressorKind } from '../../ui/plan/regressor-labels';

export interface ReachAsked {
  readonly regressor: number;
  /** In words, as a sentence begins with it: `Capex`. */
  readonly label: string;
  /** The year whose planned amount is solved for, and the one whose expected value is to be reached. */
  readonly of: number;
  readonly year: number;
  /** In the panel's unit. */
  readonly target: number;
  readonly confidence: number;
}

/** What reaches the value: `Capex of 1,234 in FY2027 brings the expected value of FY2027 to 2,750.`; or why nothing does. */
export function reachedWords(reach: Reach, asked: ReachAsked, numbers: NumberFormat): string {
  if (reach.value === null) return sentence(reach.reason);
  const { label, of, year, target, regressor } = asked;
  const amount = numbers.figure(reach.value, regressorKind(regressor));
  return `${label} of ${amount} in FY${of} brings the expected value of FY${year} to ${numbers.figure(target)}.`;
}

/** Which other values the data cannot tell from it: a range, or in words that there is none that is finite. */
export function reachRangeWords(reach: Reach, asked: ReachAsked, numbers: NumberFormat): string {
  if (reach.value === null) return '';
  const level = confidenceText(asked.confidence);
  return reach.range === null
    ? sentence(`No range: ${reach.rangeReason ?? 'none is known'}`)
    : rangeWords(reach.range, level, figuresOf(reach.value, reach.range, asked, numbers));
}

/** How the ends of a range are written: with the digits that they and the value need together. */
function figuresOf(
  value: number,
  range: FiellerRange,
  { regressor }: ReachAsked,
  numbers: NumberFormat,
): (value: number) => string {
  const kind = regressorKind(regressor);
  const ends = 'low' in range ? [range.low, range.high] : [];
  const rays = 'upTo' in range ? [range.upTo, range.from] : [];
  const digits = numbers.columnDigits([value, ...ends, ...rays], kind);
  return (end) => numbers.figure(end, kind, digits);
}

function rangeWords(range: FiellerRange, level: string, figure: (value: number) => string): string {
  switch (range.kind) {
    case 'interval':
      return `${level} range: ${figure(range.low)} to ${figure(range.high)}.`;
    case 'every-value':
      return `No finite range at ${level}: no value at all can be ruled out.`;
    case 'rays': {
      const rays = [
        ...(range.upTo === null ? [] : [`everything up to ${figure(range.upTo)}`]),
        ...(range.from === null ? [] : [`everything from ${figure(range.from)} on`]),
      ];
      return `No finite range at ${level}: ${rays.join(' and ')} cannot be ruled out.`;
    }
  }
}
