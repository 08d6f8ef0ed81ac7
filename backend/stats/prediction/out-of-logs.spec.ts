import { evidenceOf } from '../evidence/evidence-of';
import { openFit } from '../index';
import { tQuantile } from '../distributions/t-distribution';
import {
  fitOf,
  panelOf,
  type PanelRow,
  plainSpecification,
  sha256,
} from '../testing/golden-panels';
import { randomNumbers, randomPanelNames } from '../testing/random-panels';
import { unspeakable } from '../testing/unspeakable';
import {
  asFactor,
  expectedValue,
  heldRegressors,
  outOfLogs,
  predict,
  reachValue,
  symmetricInterval,
} from './index';

const beyond = 'Out of logs this lies beyond what a number can hold.';

/** x hardly varies within a company and differs between them: slopes and intercepts of hundreds of logs. */
function steepRows(): PanelRow[] {
  const random = randomNumbers(3);
  return Array.from({ length: 120 }, (_, index) => {
    const company = Math.floor(index / 12);
    const x = Math.exp(1 + company / 3 + 0.0004 * random());
    return {
      company: `C${company}`,
      year: 2000 + (index % 12),
      outcome: Math.exp(5 + random()),
      regressors: [x, 2 + random()],
    };
  });
}

const data = panelOf(steepRows(), randomPanelNames);
const steep = fitOf(data, 'C9', { form: 'log' });

describe('out of logs', () => {
  it('is null with a reason where a double cannot hold it', () => {
    const wide = { estimate: 1, standardError: 500, low: -999, high: 1001 };
    expect(outOfLogs(wide, Math.exp)).toEqual({
      estimate: Math.E,
      low: 0,
      high: null,
      intervalReason: beyond,
    });
    expect(asFactor({ ...wide, estimate: 800 }).estimate).toBeNull();
    expect(outOfLogs({ ...wide, high: 2 }, Math.exp).intervalReason).toBeUndefined();
  });

  it('leaves out an interval whose ends a double cannot hold', () => {
    expect(symmetricInterval(1e308, 1e308, 2)).toEqual({
      estimate: 1e308,
      standardError: null,
      low: null,
      high: null,
      intervalReason: 'The ends of its interval lie beyond what a number can hold.',
    });
  });

  it('never puts what JSON cannot say into a fit, its evidence or a prediction', () => {
    expect(steep.standing?.high).toBeGreaterThan(710);
    expect(unspeakable(steep)).toEqual([]);
    expect(steep.standing?.percent?.high).toBeNull();
    expect(steep.standing?.percent?.intervalReason).toBe(beyond);
    const open = openFit(
      { data, specification: plainSpecification, own: 'C9', members: undefined },
      { sha256 },
    );
    const { alternatives, verdict } = evidenceOf(open);
    expect(unspeakable({ alternatives, verdict })).toEqual([]);
  });

  it('gives a plan without a finite value its reason, and one with a finite value its open ends', () => {
    const basis = steep.prediction!;
    const [x, z] = basis.last.regressors;
    for (let power = -6; power <= 6; power += 1) {
      const years = [{ year: 2012, regressors: [x * 2 ** power, z] }];
      const outlooks = [{}, { start: 'carry-the-gap' as const }];
      for (const outlook of outlooks) {
        expect(unspeakable(predict(basis, { years, ...outlook }, tQuantile))).toEqual([]);
      }
    }
    const direction = basis.coefficients[1] > 0 ? 1 : -1;
    const farAway = [x * 1e30 ** direction, z];
    expect(predict(basis, { years: [{ year: 2012, regressors: farAway }] }, tQuantile)[0]).toEqual({
      year: 2012,
      expected: null,
      reason: 'The expected value is beyond what a number can hold.',
    });
    expect(() => expectedValue(basis, farAway)).toThrowError(RangeError);
    expect(unspeakable(expectedValue(basis, heldRegressors(basis)))).toEqual([]);
  });

  it('gives a band, and a range to reach a value, their reasons', () => {
    const basis = steep.prediction!;
    const regressors = basis.last.regressors;
    const wanted = reachValue(basis, { target: 1e300, regressor: 0, regressors });
    if (wanted.value === null) throw new Error('expected a value');
    const years = [{ year: 2012, regressors: [wanted.value, regressors[1]] }];
    const [far] = predict(basis, { years, bandConfidence: 0.999999 }, tQuantile);
    if (far.expected === null) throw new Error('expected an expected value');
    expect(far.expected.high).toBeNull();
    expect(far.expected.intervalReason).toBe(beyond);
    expect(far.band).toEqual({
      confidence: 0.999999,
      low: null,
      high: null,
      bandReason: 'An end of the band lies beyond what a number can hold.',
    });
    const reach = reachValue(basis, {
      target: basis.last.actual * 1e6,
      regressor: 1,
      regressors: basis.last.regressors,
    });
    expect(unspeakable(reach)).toEqual([]);
  });
});
