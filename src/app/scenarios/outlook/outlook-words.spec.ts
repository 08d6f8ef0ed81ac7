import type { PredictionBasis } from '@prediction';
import { usualOutlook } from '../../ui/plan/asked-plan';
import { planBasis } from '../../ui/plan/testing/plan-basis';
import { fadingWords, outlookWords } from './outlook-words';

const numbers = { figure: (value: unknown) => String(value) };
const carried: PredictionBasis = {
  ...planBasis,
  ownErrors: { years: [2024, 2025], persistence: 0.5, variance: 400 },
};

describe('outlooks in words', () => {
  it('say how much of the gap is left in each year', () => {
    expect(fadingWords(carried, [2026, 2027, 2028], numbers)).toBe(
      'Left of FY2025’s gap of 30: 50 % in FY2026, 25 % in FY2027 and 13 % in FY2028.',
    );
  });

  it('say why the gap cannot be carried', () => {
    expect(fadingWords(planBasis, [2026], numbers)).toBe(
      'The gap cannot be carried: This fit was made before the own company’s errors were kept; run it again.',
    );
  });

  it('stand in the source line, the year effect only where the fit has them', () => {
    const usual = usualOutlook(planBasis);
    expect(outlookWords(usual, planBasis)).toBe(
      'starts at the model level · 95 % intervals, 80 % band',
    );
    const yearEffects = { last: 5, lastThree: 4, ownLast: 5, ownMean: 3, lastYear: 2025 };
    const chosen = {
      ...usual,
      start: 'carry-the-gap',
      yearEffect: 'mean-of-last-three',
      confidence: 0.9,
    } as const;
    expect(outlookWords(chosen, { ...planBasis, yearEffects })).toBe(
      'carries the gap of FY2025 · year effect the mean of FY2023 to FY2025 · 90 % intervals, 80 % band',
    );
  });
});
