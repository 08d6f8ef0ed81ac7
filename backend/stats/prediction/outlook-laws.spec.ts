import * as fc from 'fast-check';
import { tQuantile } from '../distributions/t-distribution';
import { expectDigits } from '../testing/expect-digits';
import { fitOf, goldenPanel } from '../testing/golden-panels';
import {
  decompositionFromLast,
  expectedValue,
  familiarRange,
  inModelScale,
  marketValueBand,
  predict,
  reachValue,
} from './index';

const data = goldenPanel('grunfeld10_unbalanced.csv', 'inv', ['value', 'capital']);
// F07 ends in 1948, before the panel does: its last year effect is not the panel's last one.
const bases = [
  fitOf(data, 'F07').prediction!,
  fitOf(data, 'F07', { effects: 'company,year' }).prediction!,
  fitOf(data, 'F07', { form: 'log' }).prediction!,
  fitOf(data, 'F07', { effects: 'company,year', form: 'log', lag: 1 }).prediction!,
  fitOf(data, 'F05', { effects: 'company,year', lag: 1 }).prediction!,
];
const anyBasis = fc.constantFrom(...bases);
const anyPlan = fc.tuple(
  fc.double({ min: 1, max: 900, noNaN: true }),
  fc.double({ min: 1, max: 900, noNaN: true }),
);
const anyOutlook = fc.record({
  ahead: fc.integer({ min: 1, max: 5 }),
  start: fc.constantFrom('model-level' as const, 'carry-the-gap' as const),
  yearEffect: fc.constantFrom('last' as const, 'mean-of-last-three' as const, { given: 0.2 }),
});

describe('whatever the outlook', () => {
  it('the way from the last actual value adds up to the expected value', () => {
    fc.assert(
      fc.property(anyBasis, anyPlan, anyOutlook, (basis, plan, { ahead, ...look }) => {
        const outlook = { year: basis.last.year + ahead, ...look };
        const { estimate } = expectedValue(basis, plan, outlook);
        const { actual } = basis.last;
        const { terms, fadingGap, yearEffect, smearing, total } = decompositionFromLast(
          basis,
          plan,
          tQuantile,
          outlook,
        );
        const slopes = terms[0].estimate + terms[1].estimate;
        expect(total).toBe(slopes + fadingGap + (yearEffect?.estimate ?? 0) + smearing);
        const isLog = basis.form === 'log';
        const way = isLog ? Math.log(estimate / actual) : estimate - actual;
        const size = isLog ? 1 : 1 + Math.abs(estimate) + Math.abs(actual);
        expect(Math.abs(total - way)).toBeLessThan(1e-11 * size);
      }),
      { numRuns: 100 },
    );
  });

  it('a value that is reached has the target as its expected value, and lies in its range', () => {
    fc.assert(
      fc.property(
        anyBasis,
        anyPlan,
        anyOutlook,
        fc.constantFrom(0, 1),
        fc.double({ min: 0.95, max: 1.05, noNaN: true }),
        (basis, regressors, { ahead, ...look }, regressor, share) => {
          const outlook = { year: basis.last.year + ahead, ...look };
          const target = expectedValue(basis, regressors, outlook).estimate * share;
          const reach = reachValue(basis, { ...outlook, regressors, regressor, target });
          // In logs a slope of nearly zero may take a value that no number holds.
          fc.pre(reach.value !== null && (basis.form !== 'log' || reach.value > 0));
          const plan = regressors.with(regressor, reach.value ?? NaN);
          const reached = expectedValue(basis, plan, outlook).estimate;
          expect(Math.abs(reached - target)).toBeLessThan(1e-9 * (1 + Math.abs(target)));
          if (reach.value === null || reach.range?.kind !== 'interval') return;
          expect(reach.range.low).toBeLessThanOrEqual(reach.value);
          expect(reach.range.high).toBeGreaterThanOrEqual(reach.value);
        },
      ),
      { numRuns: 100 },
    );
  });

  it('the nearest plan inside is the same, on the line from what the model last read', () => {
    fc.assert(
      fc.property(anyBasis, anyPlan, anyOutlook, (basis, plan, { ahead, ...look }) => {
        // Held in both years, so that with a lag the second reads it.
        const years = [1, 2].map((h) => ({ year: basis.last.year + ahead + h, regressors: plan }));
        const read = predict(basis, { years, ...look }, tQuantile)[1];
        if (read.expected === null) throw new Error(read.reason);
        const alone = familiarRange(basis, plan);
        expect(read.familiar).toEqual(alone);
        expect(familiarRange(basis, alone.nearestInside).kind).toBe('inside');
        const [last, end, nearest] = [basis.last.regressors, plan, alone.nearestInside].map(
          (values) => inModelScale(basis, values),
        );
        const aside =
          (nearest[0] - last[0]) * (end[1] - last[1]) - (nearest[1] - last[1]) * (end[0] - last[0]);
        const size = Math.abs(end[0] - last[0]) * Math.abs(end[1] - last[1]);
        expect(Math.abs(aside)).toBeLessThan(1e-9 * (1 + size));
      }),
      { numRuns: 60 },
    );
  });

  it('the band holds the model’s point and moves with a given year effect alone', () => {
    fc.assert(
      fc.property(anyBasis, anyPlan, anyOutlook, (basis, plan, { ahead, start }) => {
        const bandOf = (given: number) => {
          const outlook = { year: basis.last.year + ahead, start, yearEffect: { given } };
          const band = marketValueBand(basis, plan, outlook, tQuantile);
          if (band.low === null) throw new Error(band.bandReason);
          const expected = expectedValue(basis, plan, outlook);
          const ends = [band.low, band.high];
          const point = expected.log?.inLogs.estimate ?? expected.estimate;
          return { band, point, ends: basis.form === 'log' ? ends.map(Math.log) : ends };
        };
        const [here, there] = [bandOf(0), bandOf(0.3)];
        const by = basis.yearEffects === null ? 0 : 0.3;
        const size = 1e-10 * (1 + Math.abs(here.ends[0]) + Math.abs(here.ends[1]));
        expect(here.band.standardError).toBe(there.band.standardError);
        here.ends.forEach((end, index) => {
          expect(Math.abs(there.ends[index] - end - by)).toBeLessThan(size);
        });
        expect(Math.abs((here.ends[0] + here.ends[1]) / 2 - here.point)).toBeLessThan(size);
      }),
      { numRuns: 60 },
    );
  });

  it('the band of a carried gap comes to that at the model’s level as the gap fades', () => {
    for (const basis of bases) {
      const year = basis.last.year + 2000;
      for (const yearEffect of ['last', 'mean-of-last-three', { given: 0.1 }] as const) {
        const [carried, level] = (['carry-the-gap', 'model-level'] as const).map((start) =>
          marketValueBand(basis, [200, 300], { year, start, yearEffect }, tQuantile),
        );
        expectDigits(carried.low, level.low ?? NaN, 12);
        expectDigits(carried.high, level.high ?? NaN, 12);
      }
    }
  });
});
