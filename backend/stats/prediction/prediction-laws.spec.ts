import * as fc from 'fast-check';
import { tQuantile } from '../distributions/t-distribution';
import type { PanelColumns, Specification } from '../fit-result';
import { expectDigits } from '../testing/expect-digits';
import { fitOf, goldenPanel } from '../testing/golden-panels';
import {
  differenceToPeer,
  expectedValue,
  type Outlook,
  peersMean,
  predict,
  type PredictedYear,
  type PredictionBasis,
  type PredictRequest,
  reachValue,
} from './index';

const data = goldenPanel('grunfeld10_unbalanced.csv', 'inv', ['value', 'capital']);
const own = 'F07';

function basisOf(specification: Partial<Specification> = {}, panel = data): PredictionBasis {
  return fitOf(panel, own, specification).prediction!;
}

const specifications: readonly Partial<Specification>[] = [
  {},
  { effects: 'company,year' },
  { form: 'log' },
  { lag: 1 },
  { effects: 'company,year', form: 'log', lag: 1 },
];
const bases = specifications.map((specification) => basisOf(specification));
const starts = fc.constantFrom('model-level' as const, 'carry-the-gap' as const);
const yearEffects = fc.constantFrom(
  'last' as const,
  'mean-of-last-three' as const,
  { given: 0.2 } as const,
);
const plans = fc.array(
  fc.tuple(
    fc.double({ min: 1, max: 900, noNaN: true }),
    fc.double({ min: 1, max: 900, noNaN: true }),
  ),
  { minLength: 1, maxLength: 5 },
);

type Read = Extract<PredictedYear, { readonly of: number }>;

function readAll(
  basis: PredictionBasis,
  plan: readonly (readonly number[])[],
  outlook: Omit<PredictRequest, 'years'> = {},
): Read[] {
  const years = plan.map((regressors, index) => ({
    year: basis.last.year + 1 + index,
    regressors,
  }));
  return predict(basis, { years, ...outlook }, tQuantile).map((year) => {
    if (year.expected === null) throw new Error(year.reason);
    return year;
  });
}

function scaled(panel: PanelColumns, factor: number, shares: readonly number[]): PanelColumns {
  const times = (values: Float64Array, by: number): Float64Array =>
    values.map((value) => value * by);
  return {
    ...panel,
    outcome: { ...panel.outcome, values: times(panel.outcome.values, factor) },
    regressors: panel.regressors.map((column, k) => ({
      ...column,
      values: times(column.values, shares[k]),
    })),
  };
}

describe('a predicted year', () => {
  it('differs from the last actual market value by exactly its parts', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...bases),
        plans,
        starts,
        yearEffects,
        (basis, plan, start, yearEffect) => {
          for (const { expected, fromLast } of readAll(basis, plan, { start, yearEffect })) {
            const slopes = fromLast.terms.reduce((sum, term) => sum + term.estimate, 0);
            const parts =
              slopes +
              fromLast.fadingGap +
              (fromLast.yearEffect?.estimate ?? 0) +
              fromLast.smearing;
            expect(fromLast.total).toBe(parts);
            const way =
              basis.form === 'log'
                ? Math.log(expected.estimate / basis.last.actual)
                : expected.estimate - basis.last.actual;
            const size = 1 + Math.abs(expected.estimate) + Math.abs(basis.last.actual);
            expect(Math.abs(fromLast.total - way)).toBeLessThan(1e-11 * size);
          }
        },
      ),
      { numRuns: 60 },
    );
  });

  it('differs from the base by its slopes’ terms and nothing else, wherever it starts', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...bases),
        plans,
        starts,
        yearEffects,
        (basis, plan, start, yearEffect) => {
          for (const year of readAll(basis, plan, { start, yearEffect })) {
            const { expected, base, difference, toBase } = year;
            expect(toBase.total).toBe(toBase.terms[0].estimate + toBase.terms[1].estimate);
            const way =
              basis.form === 'log'
                ? Math.log(expected.estimate / base.estimate)
                : expected.estimate - base.estimate;
            const size = 1 + Math.abs(expected.estimate) + Math.abs(base.estimate);
            expect(Math.abs(toBase.total - way)).toBeLessThan(1e-11 * size);
            expect(Math.abs(difference.estimate - way)).toBeLessThan(1e-11 * size);
          }
        },
      ),
      { numRuns: 60 },
    );
  });

  it('comes to the model’s level as a carried gap fades', () => {
    for (const basis of bases) {
      const year = basis.last.year + 2000;
      const at = (start: Outlook['start']) => {
        const log = expectedValue(basis, [200, 300], { year, start });
        return log.log?.inLogs ?? log;
      };
      const [carried, level] = [at('carry-the-gap'), at('model-level')];
      for (const key of ['estimate', 'standardError', 'low', 'high'] as const)
        expectDigits(carried[key], level[key] ?? NaN, 12, key);
    }
  });

  it('starts a carried gap from the last actual market value', () => {
    for (const basis of bases) {
      const { year, regressors, actual } = basis.last;
      const given = basis.yearEffects?.ownLast ?? 0;
      const outlook = { year, start: 'carry-the-gap', yearEffect: { given } } as const;
      expectDigits(expectedValue(basis, regressors, outlook).estimate, actual, 12);
    }
  });

  it('follows the measure of the outcome and of the regressors', () => {
    for (const [index, specification] of specifications.entries()) {
      if (specification.form === 'log') continue;
      const [factor, shares] = [8, [0.25, 1024]];
      const other = basisOf(specification, scaled(data, factor, shares));
      const plan = [
        [200, 100],
        [300, 500],
      ];
      const inOther = plan.map((row) => row.map((value, k) => value * shares[k]));
      for (const start of ['model-level', 'carry-the-gap'] as const) {
        const mine = readAll(bases[index], plan, { start });
        readAll(other, inOther, { start }).forEach(({ expected, band, familiar }, place) => {
          const before = mine[place];
          expectDigits(expected.estimate, before.expected.estimate * factor, 9);
          expectDigits(expected.high, (before.expected.high ?? NaN) * factor, 9);
          expectDigits(band.low, (before.band.low ?? NaN) * factor, 9);
          expectDigits(familiar.leverage, before.familiar.leverage, 9);
          expect(familiar.kind).toBe(before.familiar.kind);
        });
      }
    }
  });

  it('is the same in log form whatever the measure of the regressors', () => {
    const mine = readAll(basisOf({ form: 'log' }), [[200, 100]]);
    const other = basisOf({ form: 'log' }, scaled(data, 1000, [0.01, 100]));
    const [year] = readAll(other, [[2, 10000]]);
    for (const key of ['estimate', 'low', 'high'] as const)
      expectDigits(year.expected[key], (mine[0].expected[key] ?? NaN) * 1000, 9, key);
    expectDigits(year.familiar.leverage, mine[0].familiar.leverage, 9);
  });
});

describe('reachValue', () => {
  it('finds the value whose expected value is the target', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...bases),
        fc.tuple(
          fc.double({ min: 1, max: 900, noNaN: true }),
          fc.double({ min: 1, max: 900, noNaN: true }),
        ),
        starts,
        fc.double({ min: 0.9, max: 1.1, noNaN: true }),
        (basis, regressors, start, share) => {
          const year = basis.last.year + 2;
          const target = expectedValue(basis, regressors, { year, start }).estimate * share;
          const reach = reachValue(basis, { year, start, regressors, regressor: 1, target });
          if (reach.value === null) throw new Error(reach.reason);
          const reached = expectedValue(basis, [regressors[0], reach.value], { year, start });
          expect(Math.abs(reached.estimate - target)).toBeLessThan(1e-9 * (1 + Math.abs(target)));
        },
      ),
      { numRuns: 60 },
    );
  });
});

describe('differenceToPeer', () => {
  it('adds up to the difference of the market values', () => {
    specifications.forEach((specification, index) => {
      const basis = bases[index];
      for (const peer of basis.peers ?? []) {
        const theirs = fitOf(data, peer.company, specification).ownYears?.find(
          ({ year }) => year === basis.last.year,
        );
        const way =
          specification.form === 'log'
            ? Math.log(basis.last.actual / (theirs?.actual ?? NaN))
            : basis.last.actual - (theirs?.actual ?? NaN);
        const { intercepts, terms, residuals, total } = differenceToPeer(basis, peer, tQuantile);
        expect(total).toBe(intercepts + (terms[0].estimate + terms[1].estimate) + residuals);
        expect(Math.abs(total - way)).toBeLessThan(1e-9 * (1 + Math.abs(way)));
      }
    });
  });

  it('against the peers’ mean is the mean of the differences', () => {
    for (const basis of bases) {
      const mean = peersMean(basis, 'peers');
      if (mean === null) throw new Error('no peer has that year');
      const totals = (basis.peers ?? []).map(
        (peer) => differenceToPeer(basis, peer, tQuantile).total,
      );
      const expected = totals.reduce((sum, value) => sum + value, 0) / totals.length;
      expectDigits(differenceToPeer(basis, mean, tQuantile).total, expected, 9);
    }
  });

  it('has no mean where no peer has that year', () => {
    expect(peersMean({ ...bases[0], peers: [] }, 'peers')).toBeNull();
    expect(peersMean({ ...bases[0], peers: undefined }, 'peers')).toBeNull();
  });
});
