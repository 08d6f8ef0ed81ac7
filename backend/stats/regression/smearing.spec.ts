import { evidenceOf } from '../evidence/evidence-of';
import { type FitResult, openFit } from '../index';
import { expectDigits } from '../testing/expect-digits';
import {
  fitOf,
  panelOf,
  type PanelRow,
  plainSpecification,
  sha256,
} from '../testing/golden-panels';
import { randomNumbers, randomPanelNames } from '../testing/random-panels';
import { unspeakable } from '../testing/unspeakable';

const years = 20;

/** Five companies at 1e40; K1 lies at `lowest` in all years but its last, when it lies at 1e59. */
function panelWith(lowest: number) {
  const random = randomNumbers(5);
  const rows = Array.from({ length: 5 * years }, (_, index): PanelRow => {
    const [company, year] = [Math.floor(index / years), index % years];
    const level = company !== 1 ? 1e40 : year === years - 1 ? 1e59 : lowest;
    return {
      company: `K${company}`,
      year: 2000 + year,
      outcome: level * (1 + random()),
      regressors: [1 + random(), 2 + random()],
    };
  });
  return panelOf(rows, randomPanelNames);
}

function logFit(lowest: number, own: string | null): FitResult {
  return fitOf(panelWith(lowest), own, { form: 'log' });
}

const beyond =
  'The residuals scatter so far that their smearing factor is beyond what a number can hold.';

describe('smearing', () => {
  it('is the mean of exp(residual), over all rows and over the own company’s', () => {
    const result = logFit(1e39, 'K1');
    const own = (result.ownYears ?? []).map(({ residual }) => Math.exp(residual));
    expect(own.length).toBe(years);
    const mean = own.reduce((sum, value) => sum + value, 0) / years;
    expectDigits(result.smearing?.own, mean, 12);
    expect(result.smearing?.factor).toBeGreaterThan(1);
    expect(result.smearing?.reason).toBeUndefined();
    expect(result.predictionReason).toBeUndefined();
  });

  it('is null with a reason where a number cannot hold it, and with it what is turned back by it', () => {
    const result = logFit(1e-320, 'K1');
    expect(result.smearing).toEqual({ factor: null, own: null, reason: beyond });
    expect(result.ownYears).toBeNull();
    expect(result.prediction).toBeNull();
    expect(result.predictionReason).toBe(beyond);
    expect(result.standing).not.toBeNull();
    expect(unspeakable(result)).toEqual([]);
  });

  it('keeps the own company’s mean where that of all is beyond, and warns of no distance to it', () => {
    const result = logFit(1e-320, 'K0');
    expect(result.smearing?.factor).toBeNull();
    expect(result.smearing?.own).toBeGreaterThan(0);
    expect(result.warnings.map(({ code }) => code)).not.toContain('smear-differs');
    expect(unspeakable(result)).toEqual([]);
  });

  it('says why nothing is predicted where the factor is held and a fitted value is not', () => {
    const result = logFit(1e-250, 'K0');
    expect(result.smearing?.factor).toBeGreaterThan(1e280);
    expect(result.ownYears).toBeNull();
    expect(result.prediction).toBeNull();
    expect(result.predictionReason).toBe(
      'A fitted value out of logs is beyond what a number can hold.',
    );
    expect(unspeakable(result)).toEqual([]);
  });

  it('leaves its evidence without a number that JSON cannot say', () => {
    const specification = { ...plainSpecification, form: 'log' as const };
    const open = openFit(
      { data: panelWith(1e-320), specification, own: 'K1', members: undefined },
      { sha256 },
    );
    expect(unspeakable(evidenceOf(open))).toEqual([]);
  });
});
