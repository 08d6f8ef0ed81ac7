import { tQuantile } from '../distributions/t-distribution';
import { fitOf, goldenPanel } from '../testing/golden-panels';
import {
  decompositionToBase,
  expectedValue,
  familiarRange,
  type Outlook,
  sensitivity,
} from './index';

const data = goldenPanel('grunfeld10.csv', 'inv', ['value', 'capital']);
const basis = fitOf(data, 'F03').prediction!;
const logs = fitOf(data, 'F03', { form: 'log' }).prediction!;
const regressors = [2000, 300];

describe('sensitivity', () => {
  it('leaves all else as planned, in the outlook that is asked for', () => {
    for (const outlook of [{}, { start: 'carry-the-gap', year: 1957 }] satisfies Outlook[]) {
      const found = sensitivity(basis, { regressors, ...outlook }, tQuantile);
      if (found.regressors === null) throw new Error(found.reason);
      expect(found.regressors.length).toBe(2);
      for (const { index, low, high, change, regressor } of found.regressors) {
        const spread = basis.peerSpread![index];
        expect([low.value, high.value]).toEqual([spread.low, spread.high]);
        const [atLow, atHigh] = [low, high].map(({ value }) => regressors.with(index, value));
        expect(low.expected).toEqual(expectedValue(basis, atLow, outlook));
        expect(high.expected).toEqual(expectedValue(basis, atHigh, outlook));
        expect(low.familiar).toBe(familiarRange(basis, atLow).kind);
        expect(high.familiar).toBe(familiarRange(basis, atHigh).kind);
        const { terms } = decompositionToBase(basis, atHigh, atLow, tQuantile);
        expect(terms[index].regressor).toBe(regressor);
        expect(change.estimate).toBe(terms[index].estimate);
        expect(change.high).toBe(terms[index].high);
      }
    }
  });

  it('puts the largest change first, whatever its sign', () => {
    const turned = { ...basis, coefficients: [0, 0.0001, -5] };
    const found = sensitivity(turned, { regressors }, tQuantile);
    expect(found.regressors?.map(({ regressor }) => regressor)).toEqual(['capital', 'value']);
    expect(found.regressors?.[0].change.estimate).toBeLessThan(0);
  });

  it('says why there is none', () => {
    const none = (reason: string) => ({ regressors: null, reason });
    expect(sensitivity({ ...basis, peerSpread: undefined }, { regressors }, tQuantile)).toEqual(
      none('This fit was made before the spread of the peers’ values was kept; run it again.'),
    );
    expect(sensitivity(basis, { regressors: [NaN, 1] }, tQuantile)).toEqual(
      none('No value is given for value.'),
    );
    expect(sensitivity(logs, { regressors: [-1, 1] }, tQuantile)).toEqual(
      none('The log form needs values above zero; value is not.'),
    );
    const unknown = {
      ...basis,
      ownErrors: { ...basis.ownErrors!, persistence: null, persistenceReason: 'Unknown.' },
    };
    const carried = { regressors, start: 'carry-the-gap' } as const;
    expect(sensitivity(unknown, carried, tQuantile)).toEqual(none('Unknown.'));
  });

  it('says of an end beyond what a number can hold just that', () => {
    const far = { ...logs, peerSpread: [{ low: 1, high: 1e300 }, logs.peerSpread![1]] };
    const steep = { ...far, coefficients: [0, 50, 1] };
    const found = sensitivity(steep, { regressors }, tQuantile);
    const high = found.regressors?.find(({ index }) => index === 0)?.high;
    expect(high).toEqual({
      value: 1e300,
      familiar: 'outside',
      expected: null,
      reason: 'The expected value is beyond what a number can hold.',
    });
  });
});
