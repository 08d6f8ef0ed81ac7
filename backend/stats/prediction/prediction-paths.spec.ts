import { tQuantile } from '../distributions/t-distribution';
import type { Specification } from '../fit-result';
import { expectDigits } from '../testing/expect-digits';
import { fitOf, goldenJson, goldenPanel } from '../testing/golden-panels';
import {
  familiarRange,
  type FiellerRange,
  predict,
  type PredictionBasis,
  reachValue,
  type StartingPoint,
  type YearEffectChoice,
} from './index';

/** From the full dummy regression by definition, in numpy: `tools/reference/prediction.py`. */
interface Look {
  readonly start: StartingPoint;
  readonly yearEffect: YearEffectChoice;
  readonly point: number;
  readonly standardError: number;
  readonly estimate: number;
  readonly low: number;
  readonly high: number;
  readonly bandStandardError: number;
  readonly bandLow: number;
  readonly bandHigh: number;
  readonly fromLast: number;
  readonly yearEffectChange?: { readonly estimate: number; readonly standardError: number };
  readonly reach: readonly {
    readonly regressor: number;
    readonly target: number;
    readonly value: number;
    readonly range: FiellerRange;
  }[];
}

interface PredictionCase {
  readonly label: string;
  readonly file: string;
  readonly outcome: string;
  readonly regressors: readonly string[];
  readonly own: string;
  readonly specification: Pick<Specification, 'effects' | 'form' | 'lag' | 'confidence'>;
  readonly slopes: readonly number[];
  readonly persistence: number;
  readonly errorVariance: number;
  readonly bandDegreesOfFreedom: number;
  readonly smear: number | null;
  readonly held: readonly number[];
  readonly largestOwnLeverage: number;
  readonly largestLeverage: number;
  readonly predictions: readonly {
    readonly year: number;
    readonly regressors: readonly number[];
    readonly leverage: number;
    readonly looks: readonly Look[];
  }[];
}

const { cases } = goldenJson<{ readonly cases: readonly PredictionCase[] }>(
  'prediction-paths.json',
);

/** The quantiles of t are another implementation's too; the rest agrees to more. */
const digits = 9;

for (const outside of cases) {
  describe(`predictions of ${outside.own}, ${outside.label}`, () => {
    const data = goldenPanel(outside.file, outside.outcome, outside.regressors);
    const basis = fitOf(data, outside.own, outside.specification).prediction!;

    it('rest on the own company’s errors, its last values and the familiar range', () => {
      outside.slopes.forEach((slope, k) => {
        expectDigits(basis.coefficients[k + 1], slope, digits);
      });
      expectDigits(basis.ownErrors?.persistence, outside.persistence, digits, 'ρ');
      expectDigits(basis.ownErrors?.variance, outside.errorVariance, digits, 's²');
      expectDigits(basis.largestOwnLeverage, outside.largestOwnLeverage, digits, 'own leverage');
      expectDigits(basis.largestLeverage, outside.largestLeverage, digits, 'leverage');
      expect(basis.held).toEqual(outside.held);
      if (outside.smear === null) expect(basis.smear).toBeNull();
      else expectDigits(basis.smear, outside.smear, digits, 'smear');
    });

    for (const { year, regressors, leverage, looks } of outside.predictions) {
      it(`agree in every look at ${year}`, () => {
        expectDigits(familiarRange(basis, regressors).leverage, leverage, digits, 'leverage');
        for (const look of looks) {
          holdLook(basis, { year, regressors, look });
          expectDigits(
            degreesOf(basis, { year, regressors, look }),
            outside.bandDegreesOfFreedom,
            digits,
          );
        }
      });
    }
  });
}

interface Planned {
  readonly year: number;
  readonly regressors: readonly number[];
  readonly look: Look;
}

/** The plan that makes the model read these regressors in that year. */
function predicted(basis: PredictionBasis, { year, regressors, look }: Planned) {
  const { start, yearEffect } = look;
  const inBasis = basis.lag === 1 ? { ...basis, held: regressors } : basis;
  const years =
    basis.lag === 1 && year > basis.last.year + 1
      ? [year - 1, year].map((planned) => ({ year: planned, regressors }))
      : [{ year, regressors }];
  const found = predict(inBasis, { years, start, yearEffect }, tQuantile).at(-1);
  if (found?.expected == null) throw new Error(`refused ${year}: ${found?.reason}`);
  return found;
}

function degreesOf(basis: PredictionBasis, planned: Planned): number | null {
  const { band } = predicted(basis, planned);
  return band.low === null ? null : band.degreesOfFreedom;
}

function holdLook(basis: PredictionBasis, planned: Planned): void {
  const { look, year, regressors } = planned;
  const context = `${year}, ${look.start}, ${JSON.stringify(look.yearEffect)}`;
  const { expected, band, fromLast } = predicted(basis, planned);
  const inModel = expected.log?.inLogs ?? expected;
  expectDigits(inModel.estimate, look.point, digits, `${context}: point`);
  expectDigits(inModel.standardError, look.standardError, digits, `${context}: se`);
  for (const key of ['estimate', 'low', 'high'] as const)
    expectDigits(expected[key], look[key], digits, `${context}: ${key}`);
  if (band.low === null) throw new Error(band.bandReason);
  expectDigits(band.standardError, look.bandStandardError, digits, `${context}: band`);
  expectDigits(band.low, look.bandLow, digits, `${context}: band from`);
  expectDigits(band.high, look.bandHigh, digits, `${context}: band to`);
  // The difference of two large figures keeps their digits, not its own.
  const scale = Math.abs(look.point) + Math.abs(look.fromLast);
  expect(Math.abs(fromLast.total - look.fromLast))
    .withContext(context)
    .toBeLessThan(1e-9 * scale);
  const change = look.yearEffectChange;
  if (change !== undefined) {
    expectDigits(fromLast.yearEffect?.estimate, change.estimate, digits, `${context}: change`);
    expectDigits(fromLast.yearEffect?.standardError, change.standardError, digits, context);
  }
  for (const { regressor, target, value, range } of look.reach) {
    const { start, yearEffect } = look;
    const reach = reachValue(basis, { year, regressors, regressor, target, start, yearEffect });
    const what = `${context}: reaching by ${basis.regressors[regressor]}`;
    expectDigits(reach.value, value, digits, what);
    if (reach.value === null || reach.range === null) throw new Error(`${what} has no range`);
    holdRange(reach.range, range, what);
  }
}

function holdRange(found: FiellerRange, expected: FiellerRange, context: string): void {
  expect(found.kind).withContext(context).toBe(expected.kind);
  if (found.kind === 'interval' && expected.kind === 'interval') {
    expectDigits(found.low, expected.low, digits, context);
    expectDigits(found.high, expected.high, digits, context);
  }
  if (found.kind === 'rays' && expected.kind === 'rays') {
    expectDigits(found.upTo, expected.upTo ?? NaN, digits, context);
    expectDigits(found.from, expected.from ?? NaN, digits, context);
  }
}
