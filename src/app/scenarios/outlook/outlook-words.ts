import type { PlanOutlook } from '@contract';
import { type PredictionBasis, carryingReason } from '@prediction';
import type { NumberFormat } from '../../ui/number-format';
import { confidenceText, listed, sentence } from '../../ui/phrases';

/**
 * How the last gap fades over the planned years: `Of the gap of FY2025, 50 % is left in FY2026 and 25 % in FY2027.`;
 * why it cannot be carried where it cannot.
 */
export function fadingWords(
  basis: PredictionBasis,
  years: readonly number[],
  numbers: Pick<NumberFormat, 'figure'>,
): string {
  const reason = carryingReason(basis);
  const persistence = basis.ownErrors?.persistence ?? null;
  if (reason !== undefined || persistence === null)
    return `The gap cannot be carried: ${sentence(reason ?? 'how errors persist is unknown')}`;
  const { year: last, residual } = basis.last;
  const left = years.map((year) => `${shareText(persistence ** (year - last))} in FY${year}`);
  const gap = basis.form === 'log' ? '' : ` of ${numbers.figure(residual)}`;
  return `Left of FY${last}’s gap${gap}: ${listed(left)}.`;
}

function shareText(share: number): string {
  const percent = share * 100;
  const text = Math.abs(percent) >= 10 ? percent.toFixed(0) : Number(percent.toPrecision(2));
  return `${text} %`.replace('-', '−');
}

/** The outlook as the source line says it: `model level · year effect of FY2025 · 95 % intervals, 80 % band`. */
export function outlookWords(outlook: PlanOutlook, basis: PredictionBasis): string {
  const { start, yearEffect, confidence, bandConfidence } = outlook;
  const effect =
    basis.yearEffects === undefined || basis.yearEffects === null
      ? []
      : [yearEffectText(yearEffect, basis.yearEffects.lastYear)];
  return [
    start === 'carry-the-gap'
      ? `carries the gap of FY${basis.last.year}`
      : 'starts at the model level',
    ...effect,
    `${confidenceText(confidence)} intervals, ${confidenceText(bandConfidence)} band`,
  ].join(' · ');
}

function yearEffectText(effect: PlanOutlook['yearEffect'], lastYear: number): string {
  if (typeof effect === 'object') return `year effect given as ${effect.given}`;
  return effect === 'last'
    ? `year effect of FY${lastYear}`
    : `year effect the mean of FY${lastYear - 2} to FY${lastYear}`;
}
