import { tQuantile } from '../distributions/t-distribution';
import { fitOf, goldenPanel } from '../testing/golden-panels';
import { atConfidence, differenceOfPlans, expectedValue, predict } from './index';

const data = goldenPanel('grunfeld10_unbalanced.csv', 'inv', ['value', 'capital']);

describe('atConfidence', () => {
  it('is the basis of the same fit at that confidence', () => {
    for (const specification of [{}, { effects: 'company,year', form: 'log' }] as const) {
      const basis = fitOf(data, 'F07', specification).prediction!;
      for (const confidence of [0.6, 0.8, 0.99, 1 - 2 ** -53]) {
        const other = fitOf(data, 'F07', { ...specification, confidence }).prediction!;
        expect(atConfidence(basis, confidence, tQuantile)).toEqual(other);
        const years = [{ year: basis.last.year + 2, regressors: [200, 300] }];
        const [found] = predict(atConfidence(basis, confidence, tQuantile), { years }, tQuantile);
        expect([found]).toEqual([...predict(other, { years }, tQuantile)]);
      }
    }
  });

  it('is the basis itself at its own confidence', () => {
    const basis = fitOf(data, 'F07').prediction!;
    expect(atConfidence(basis, 0.95, tQuantile)).toBe(basis);
  });

  it('widens every interval with the confidence, and no estimate', () => {
    const basis = fitOf(data, 'F07').prediction!;
    const wider = atConfidence(basis, 0.99, tQuantile);
    const [narrow, wide] = [basis, wider].map((one) => expectedValue(one, [200, 300]));
    expect(wide.high!).toBeGreaterThan(narrow.high!);
    expect(wide.estimate).toBe(narrow.estimate);
    const [slope, wideSlope] = [basis, wider].map((one) =>
      differenceOfPlans(one, [200, 300], [100, 100], tQuantile),
    );
    expect(wideSlope.low!).toBeLessThan(slope.low!);
    expect(wideSlope.standardError).toBe(slope.standardError);
  });

  it('keeps a basis without intervals as it is but for the level', () => {
    const basis = { ...fitOf(data, 'F07').prediction!, lambdas: [], intervalReason: 'None.' };
    expect(atConfidence(basis, 0.8, tQuantile)).toEqual({ ...basis, confidence: 0.8 });
  });

  it('refuses what is no confidence', () => {
    const basis = fitOf(data, 'F07').prediction!;
    for (const confidence of [0, 1, -0.5, NaN])
      expect(() => atConfidence(basis, confidence, tQuantile)).toThrowError(RangeError);
  });
});
