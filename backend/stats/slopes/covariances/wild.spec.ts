import type { PanelColumns, SlopeEstimate, Specification } from '../../fit-result';
import { leastSquares } from '../../linear-algebra/least-squares';
import type { OpenFit } from '../../fit-parts';
import { openFit } from '../../open-fit';
import type { WithinFit } from '../../regression/within-fit';
import { expectDigits } from '../../testing/expect-digits';
import {
  goldenJson,
  goldenPanel,
  panelOf,
  plainSpecification,
  sha256,
} from '../../testing/golden-panels';
import { randomNumbers } from '../../testing/random-panels';
import { acceptedStretches, bootstrapPValue } from '../bootstrap/accepted-values';
import { drawStatistics, slopeScores } from '../bootstrap/draw-statistics';
import { signDraws } from '../bootstrap/sign-draws';
import { slopeInference } from '../slope-inference';

interface Golden {
  readonly meta: { readonly dependent: string; readonly regressors: readonly string[] };
  readonly wild_cluster_bootstrap: Readonly<
    Record<
      string,
      {
        readonly p_value_H0_zero: number;
        readonly t_CR0: number;
        readonly ci95_low: number;
        readonly ci95_high: number;
      }
    >
  >;
}

function open(data: PanelColumns, specification: Partial<Specification> = {}): OpenFit {
  const request = { data, own: null, members: undefined };
  const asked = { ...plainSpecification, ...specification };
  return openFit({ ...request, specification: asked }, { sha256 });
}

/** Every sign vector but for its opposite. */
function everyVector(companies: number): Int8Array[] {
  return Array.from({ length: 2 ** (companies - 1) }, (_, bits) =>
    Int8Array.from({ length: companies }, (__, company) => ((bits >> company) & 1 ? -1 : 1)),
  );
}

function wildOf(
  data: PanelColumns,
  specification: Partial<Specification> = {},
): readonly SlopeEstimate[] {
  return open(data, { slopes: 'wild', seed: 1, ...specification }).inference.slopes;
}

/** A panel of companies of unlike size; the same numbers for the same seed. */
function randomPanel(companies: number, years: number, seed: number): PanelColumns {
  const random = randomNumbers(seed);
  const rows = Array.from({ length: companies * years }, (_, index) => {
    const company = Math.floor(index / years);
    const regressors = [random() * (1 + company), random()];
    const shock = (random() - 0.5) * (1 + company / 2);
    return {
      company: `K${String(company).padStart(2, '0')}`,
      year: 2000 + (index % years),
      outcome: company + regressors[0] - regressors[1] + shock + (index % years) * 0.1,
      regressors,
    };
  });
  return panelOf(rows, { outcome: 'y', regressors: ['x', 'z'] });
}

describe('the wild bootstrap', () => {
  for (const file of [
    'grunfeld10',
    'grunfeld11',
    'grunfeld11_value_on_inv_capital',
    'grunfeld10_unbalanced',
    'grunfeld10_loglog',
    'usairlines',
  ]) {
    it(`agrees on ${file} with another program that refits every draw`, () => {
      const golden = goldenJson<Golden>(`${file}.json`);
      const { dependent, regressors } = golden.meta;
      const data = goldenPanel(`${file}.csv`, dependent, regressors);
      const { ground } = open(data);
      wildOf(data).forEach((slope, k) => {
        const block = golden.wild_cluster_bootstrap[slope.name];
        const error = slope.standardError ?? NaN;
        expect(slope.pValue).toBe(block.p_value_H0_zero);
        expectDigits(slope.statistic, block.t_CR0, 9, `t of ${slope.name}`);
        expect(slope.degreesOfFreedom).toBeNull();
        // The other program counts |t*| ≥ |t|(1 − 1e-10) as a tie, the engine 1 − 1e-9: that moves an end by less than
        // 1e-7 standard errors. With the other's allowance the ends agree to 9 digits.
        expect(Math.abs((slope.low ?? NaN) - block.ci95_low)).toBeLessThan(1e-7 * error);
        expect(Math.abs((slope.high ?? NaN) - block.ci95_high)).toBeLessThan(1e-7 * error);
        const draws = signDraws(ground.products.length, null);
        const statistics = drawStatistics(slopeScores(ground, k, error), draws, () => undefined);
        const stretches = acceptedStretches(statistics, draws, { level: 0.05, tie: 1e-10 });
        const low = slope.estimate - stretches[stretches.length - 1].to * error;
        const high = slope.estimate - stretches[0].from * error;
        expectDigits(low, block.ci95_low, 9, `low of ${slope.name}`);
        expectDigits(high, block.ci95_high, 9, `high of ${slope.name}`);
      });
    });
  }

  it('keeps a hole inside the interval and says that there is one', () => {
    const data = goldenPanel('grunfeld10.csv', 'inv', ['value', 'capital']);
    const { result, fit } = open(data, { slopes: 'wild', seed: 1 });
    const [warning, ...others] = result.warnings.filter(
      ({ code }) => code === 'wild-set-disconnected',
    );
    expect(others).toEqual([]);
    expect(warning.subjects).toEqual(['capital']);
    const { standardError, estimate, low, high } = result.slopes[1];
    // 1.7 standard errors above the estimate lies the hole; checked by refits of every draw.
    const inside = estimate + 1.7 * (standardError ?? NaN);
    expect(inside).toBeGreaterThan(low ?? NaN);
    expect(inside).toBeLessThan(high ?? NaN);
    expect(denseStatistics(fit, 1, inside, everyVector(10)).share).toBeLessThan(0.05);
    const beyond = estimate + 2.5 * (standardError ?? NaN);
    expect(denseStatistics(fit, 1, beyond, everyVector(10)).share).toBeGreaterThanOrEqual(0.05);
  });

  for (const [effects, companies] of [
    ['company', 7],
    ['company,year', 7],
    ['company', 14],
    ['company,year', 14],
  ] as const) {
    it(`equals its definition written out row by row, ${companies} companies, effects ${effects}`, () => {
      const data = randomPanel(companies, 6, 40 + companies);
      const { fit, ground, inference } = open(data, { slopes: 'wild', seed: 5, effects });
      inference.slopes.forEach((slope, k) => {
        if (companies > 12) {
          const draws = signDraws(companies, 5);
          const signs = Array.from({ length: draws.count }, () => {
            const vector = new Int8Array(companies);
            draws.next(vector);
            return vector;
          }).slice(0, 200);
          const { own, outlying } = denseStatistics(fit, k, 0, signs);
          const engine = drawStatistics(
            slopeScores(ground, k, slope.standardError ?? NaN),
            { ...signDraws(companies, 5), count: 200, pValue: Number },
            () => undefined,
          );
          expect(bootstrapPValue(engine, { pValue: Number }, own)).toBe(outlying);
          return;
        }
        const signs = everyVector(companies);
        const { own, share } = denseStatistics(fit, k, 0, signs);
        expectDigits(slope.statistic, own, 9, `t of ${slope.name}`);
        expect(slope.pValue).toBe(share);
        for (const end of [slope.low ?? NaN, slope.high ?? NaN]) {
          const inward = Math.sign(slope.estimate - end) * 1e-6;
          expect(denseStatistics(fit, k, end + inward, signs).share).toBeGreaterThanOrEqual(0.05);
          expect(denseStatistics(fit, k, end - inward, signs).share).toBeLessThan(0.05);
        }
      });
    });
  }

  it('gives no 95 % interval for five companies, and says why', () => {
    for (const slope of wildOf(randomPanel(5, 8, 3))) {
      expect([slope.low, slope.high]).toEqual([null, null]);
      expect(slope.intervalReason).toContain('0.0625');
      expect(slope.pValue).toBeGreaterThanOrEqual(0.0625);
      expect(slope.standardError).toBeGreaterThan(0);
    }
    for (const slope of wildOf(randomPanel(5, 8, 3), { confidence: 0.9 })) {
      expect(slope.low).toBeLessThan(slope.estimate);
    }
  });

  it('repeats its draws for the same seed and not for another', () => {
    const data = randomPanel(20, 6, 9);
    const first = wildOf(data, { seed: 12 });
    expect(wildOf(data, { seed: 12 })).toEqual(first);
    expect(wildOf(data, { seed: 13 })).not.toEqual(first);
  });

  it('leaves an end open where flipping the companies that matter changes nothing', () => {
    // x moves within two companies of eight only: of 128 vectors, half flip both or neither.
    const random = randomNumbers(17);
    const rows = Array.from({ length: 64 }, (_, index) => ({
      company: `K${Math.floor(index / 8)}`,
      year: 2000 + (index % 8),
      outcome: random(),
      regressors: [index < 16 ? random() : 1],
    }));
    const [slope] = wildOf(panelOf(rows, { outcome: 'y', regressors: ['x'] }));
    expect([slope.low, slope.high, slope.unbounded]).toEqual([null, null, 'both']);
    expect(slope.intervalReason).toContain('No value is rejected');
  });

  it('has no figures for a slope that one company alone determines, and says so', () => {
    const random = randomNumbers(23);
    const rows = Array.from({ length: 64 }, (_, index) => ({
      company: `K${Math.floor(index / 8)}`,
      year: 2000 + (index % 8),
      outcome: random(),
      regressors: [index < 8 ? random() : 1],
    }));
    const [slope] = wildOf(panelOf(rows, { outcome: 'y', regressors: ['x'] }));
    const { standardError, statistic, pValue, low, high } = slope;
    expect([standardError, statistic, pValue, low, high]).toEqual([null, null, null, null, null]);
    expect(slope.intervalReason).toContain('one company alone');
  });

  it('tells its progress a hundred times at most, and ends at 1', () => {
    const { ground } = open(randomPanel(15, 5, 2));
    const told: number[] = [];
    slopeInference(ground, 'wild', {
      confidence: 0.95,
      seed: 3,
      onProgress: (share) => told.push(share),
    });
    expect(told.length).toBeLessThanOrEqual(100);
    expect(told).toEqual([...told].sort((left, right) => left - right));
    expect(told.at(-1)).toBe(1);
  });

  it('keeps the estimate where nothing around it is accepted', () => {
    // Two companies and their doubles: draws that flip a company and not its double are never further out.
    const half = randomPanel(2, 10, 4);
    const doubled = Float64Array.from([...half.outcome.values, ...half.outcome.values]);
    const data: PanelColumns = {
      companies: ['C0', 'C1', 'E0', 'E1'],
      company: Int32Array.from(doubled, (_, row) => Math.floor(row / 10)),
      year: Int32Array.from([...half.year, ...half.year]),
      outcome: { name: 'y', values: doubled },
      regressors: half.regressors.map(({ name, values }) => ({
        name,
        values: Float64Array.from([...values, ...values]),
      })),
      fileRow: Int32Array.from(doubled, (_, row) => row + 2),
    };
    for (const confidence of [0.05, 0.1, 0.2, 0.3, 0.5]) {
      for (const { low, high, estimate } of wildOf(data, { confidence })) {
        expect(low).toBeLessThanOrEqual(estimate);
        expect(high).toBeGreaterThanOrEqual(estimate);
      }
    }
    const lone = Float64Array.of(0, 0, 1, 0, 0);
    const never = { pValue: (count: number): number => count };
    expect(acceptedStretches(lone, never, { level: 0.5 })).toEqual([{ from: 0, to: 0 }]);
  });
});

/**
 * The definition itself, slow: y − b0·x_k regressed on the other columns, its residuals flipped by company, every draw
 * refitted row by row. The share counts |t*| ≥ |t|(1 − 1e-9).
 */
function denseStatistics(
  fit: WithinFit,
  slope: number,
  imposed: number,
  signs: readonly Int8Array[],
): { readonly own: number; readonly outlying: number; readonly share: number } {
  const columns = fit.columns.map(({ values }) => values);
  const tested = fit.yearColumns + slope;
  const others = columns.filter((_, k) => k !== tested);
  const y = fit.outcome.values;
  const moved = y.map((value, row) => value - imposed * columns[tested][row]);
  const { residuals } = leastSquares(others, moved);
  const rest = leastSquares(others, columns[tested]).residuals;
  const squares = rest.reduce((sum, value) => sum + value * value, 0);
  const { starts } = fit.sample;
  const code = Int32Array.from(y, (_, row) => starts.filter((start) => start <= row).length - 1);
  const t = (outcome: Float64Array): number => {
    const full = leastSquares(columns, outcome);
    const scores = new Float64Array(fit.sample.companies.length);
    rest.forEach((value, row) => (scores[code[row]] += (value * full.residuals[row]) / squares));
    const variance = scores.reduce((sum, value) => sum + value * value, 0);
    return (full.coefficients[tested] - imposed) / Math.sqrt(variance);
  };
  const own = t(y);
  const outlying = signs.filter((vector) => {
    const drawn = y.map((value, row) => {
      const fitted = value - residuals[row];
      return fitted + vector[code[row]] * residuals[row];
    });
    return Math.abs(t(drawn)) >= Math.abs(own) * (1 - 1e-9);
  });
  return { own, outlying: outlying.length, share: outlying.length / signs.length };
}
