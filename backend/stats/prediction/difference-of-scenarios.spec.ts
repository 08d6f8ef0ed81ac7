import * as fc from 'fast-check';
import { tQuantile } from '../distributions/t-distribution';
import { fitOf, goldenPanel } from '../testing/golden-panels';
import {
  asFactor,
  differenceOfPlans,
  differenceOfScenarios,
  expectedValue,
  type Outlook,
  type ScenarioSide,
} from './index';

const data = goldenPanel('grunfeld10_unbalanced.csv', 'inv', ['value', 'capital']);
const bases = [
  fitOf(data, 'F07').prediction!,
  fitOf(data, 'F07', { effects: 'company,year' }).prediction!,
  fitOf(data, 'F07', { effects: 'company,year', form: 'log', lag: 1 }).prediction!,
];
const values = fc.tuple(
  fc.double({ min: 1, max: 900, noNaN: true }),
  fc.double({ min: 1, max: 900, noNaN: true }),
);
const outlooks = fc.record({
  year: fc.integer({ min: 1949, max: 1953 }),
  start: fc.constantFrom('model-level' as const, 'carry-the-gap' as const),
  yearEffect: fc.constantFrom('last' as const, 'mean-of-last-three' as const, { given: 0.2 }),
});
const sides = fc.record({ regressors: values, outlook: outlooks });

describe('differenceOfScenarios', () => {
  it('is the difference of the expected values that are shown, or in logs their ratio', () => {
    fc.assert(
      fc.property(fc.constantFrom(...bases), sides, sides, (basis, left, right) => {
        const shown = ({ regressors, outlook }: ScenarioSide): number =>
          expectedValue(basis, regressors, outlook).estimate;
        const found = differenceOfScenarios(basis, left, right, tQuantile);
        const [way, size] =
          basis.form === 'log'
            ? [Math.log(shown(left) / shown(right)), 1]
            : [shown(left) - shown(right), 1 + Math.abs(shown(left)) + Math.abs(shown(right))];
        expect(Math.abs(found.estimate - way)).toBeLessThan(1e-11 * size);
        if (basis.form === 'log')
          expect(asFactor(found).estimate).toBeCloseTo(shown(left) / shown(right), 8);
      }),
      { numRuns: 100 },
    );
  });

  it('is a difference of plans where both start alike and take the same year effect', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...bases),
        values,
        values,
        outlooks,
        (basis, one, other, outlook) => {
          const found = differenceOfScenarios(
            basis,
            { regressors: one, outlook },
            { regressors: other, outlook },
            tQuantile,
          );
          const plans = differenceOfPlans(basis, one, other, tQuantile);
          expect(found).toEqual({ kind: 'slopes', smearing: 0, ...plans });
        },
      ),
      { numRuns: 60 },
    );
  });

  it('turns its sign and its ends when the sides change places', () => {
    fc.assert(
      fc.property(fc.constantFrom(...bases), sides, sides, (basis, left, right) => {
        const found = differenceOfScenarios(basis, left, right, tQuantile);
        const turned = differenceOfScenarios(basis, right, left, tQuantile);
        const size = 1e-9 * (1 + Math.abs(found.high ?? NaN) + Math.abs(found.low ?? NaN));
        expect(turned.kind).toBe(found.kind);
        expect(Math.abs(turned.estimate + found.estimate)).toBeLessThan(size);
        expect(Math.abs((turned.low ?? NaN) + (found.high ?? NaN))).toBeLessThan(size);
      }),
      { numRuns: 60 },
    );
  });

  it('of a scenario and itself is nothing, without doubt', () => {
    const side = { regressors: [200, 300], outlook: { start: 'carry-the-gap' as const } };
    for (const basis of bases) {
      const { estimate, low, high } = differenceOfScenarios(basis, side, side, tQuantile);
      expect([estimate, low, high]).toEqual([0, 0, 0]);
    }
  });

  it('has the reason of a basis without calibrated intervals only where it needs one', () => {
    const basis = { ...bases[0], intervalReason: 'Too few years.' };
    const of = (outlook: Outlook): ScenarioSide => ({ regressors: [200, 300], outlook });
    const other = { regressors: [100, 300], outlook: {} };
    const calibrated = differenceOfScenarios(
      basis,
      of({ start: 'carry-the-gap' }),
      other,
      tQuantile,
    );
    expect(calibrated.intervalReason).toBe('Too few years.');
    expect(differenceOfScenarios(basis, of({}), other, tQuantile).high).not.toBeNull();
  });

  it('refuses values the model cannot read', () => {
    const side = { regressors: [200, 300], outlook: {} };
    const odd = { regressors: [0, 300], outlook: {} };
    expect(() => differenceOfScenarios(bases[2], side, odd, tQuantile)).toThrowError(RangeError);
  });
});
