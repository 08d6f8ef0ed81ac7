import type { Sentence, SentenceFigure } from '../../contract';
import { digitsFor, intervalDigits } from '../../figures';

export type SentencePart = Sentence[number];
export type FigureKind = SentenceFigure['kind'];

/** An estimate as it is shown: money in the panel's unit, a share as 0.62. */
export interface ShownEstimate {
  readonly estimate: number;
  readonly low: number | null;
  readonly high: number | null;
  readonly unbounded?: 'low' | 'high' | 'both' | undefined;
}

/** Significant digits of a figure in a sentence. */
export const sentenceDigits = 3;
const percentDigits = 1;

export function words(text: string): SentencePart {
  return { text };
}

export const unitPart: SentencePart = { unit: true };

export function countPart(value: number): SentencePart {
  return { figure: null, kind: 'count', value, digits: 0, isSize: false };
}

/** One number at so many significant digits. */
export function numberPart(
  figure: string | null,
  kind: FigureKind,
  value: number,
  significant = sentenceDigits,
): SentencePart {
  return written(figure, kind, value, shownDigits(kind, digitsFor(value, significant)), false);
}

/**
 * `2,410 (1,280 to 3,540)`: an estimate and its interval, each number tied to the figure. The digits are those of the
 * estimate, or of the interval where it is so wide that the estimate's would say nothing.
 *
 * @param isSize  whether words beside it say the direction: all three are then written without their signs, the ends in
 *   the order of their size. For intervals that do not hold zero.
 */
export function estimateParts(
  figure: string | null,
  kind: FigureKind,
  shown: ShownEstimate,
  isSize = false,
  significant = sentenceDigits,
): readonly SentencePart[] {
  const { estimate, unbounded } = shown;
  const isTurned = isSize && estimate < 0;
  const [low, high] = isTurned ? [shown.high, shown.low] : [shown.low, shown.high];
  const factor = kind === 'percent' ? 100 : 1;
  const digits = shownDigits(
    kind,
    intervalDigits(
      estimate * factor,
      scaled(shown.low, factor),
      scaled(shown.high, factor),
      significant,
    ),
  );
  const part = (number: number) => written(figure, kind, number, digits, isTurned);
  if (low !== null && unbounded === 'high')
    return [part(estimate), words(' ('), part(low), words(' and up)')];
  if (high !== null && unbounded === 'low')
    return [part(estimate), words(' ('), part(high), words(' and down)')];
  if (low === null || high === null) return [part(estimate), words(' (no interval)')];
  return [part(estimate), words(' ('), part(low), words(' to '), part(high), words(')')];
}

function written(
  figure: string | null,
  kind: FigureKind,
  value: number,
  digits: number,
  isSize: boolean,
): SentenceFigure {
  return { figure, kind, value, digits, isSize };
}

function shownDigits(kind: FigureKind, digits: number): number {
  if (kind === 'count') return 0;
  return kind === 'percent' ? Math.max(0, Math.min(percentDigits, digits)) : digits;
}

function scaled(value: number | null, factor: number): number | null {
  return value === null ? null : value * factor;
}
