import type { FitResult } from '../fit-result';
import { expectedValue } from '../prediction';
import { expectDigits } from '../testing/expect-digits';
import { fitOf, goldenJson, goldenPanel, panelOf, type PanelRow } from '../testing/golden-panels';
import { randomNumbers } from '../testing/random-panels';

interface GoldenStanding {
  readonly estimate: number;
  readonly standardError: number;
  readonly low: number;
  readonly high: number;
  readonly calibration: number;
  readonly persistence: number;
  readonly ownPersistence: number | null;
  readonly rank: number;
  readonly rankSet: readonly [number, number];
}

interface GoldenStandings {
  readonly results: readonly {
    readonly file: string;
    readonly outcome: string;
    readonly regressors: readonly string[];
    readonly cosines: number;
    readonly standings: Readonly<Record<string, GoldenStanding>>;
  }[];
}

interface GoldenInterval {
  readonly estimate: number;
  readonly standardError: number;
}

interface GapAndDrift {
  readonly cases: readonly {
    readonly file: string;
    readonly outcome: string;
    readonly regressors: readonly string[];
    readonly own: string;
    readonly gapPath: FitResult['gapPath'] & object;
    readonly pairs: Readonly<Record<string, GoldenInterval>>;
    readonly drift: GoldenInterval;
    readonly expected: readonly (GoldenInterval & { readonly regressors: readonly number[] })[];
    readonly interceptStandardErrors: Readonly<Record<string, number>>;
  }[];
}

for (const { file, outcome, regressors, cosines, standings } of goldenJson<GoldenStandings>(
  'standing.json',
).results) {
  describe(`standings of ${file}`, () => {
    const data = goldenPanel(file, outcome, regressors);
    for (const [company, golden] of Object.entries(standings)) {
      it(`agrees for ${company}, rank set included`, () => {
        const { standing } = fitOf(data, company);
        for (const key of [
          'estimate',
          'standardError',
          'low',
          'high',
          'calibration',
          'persistence',
        ] as const) {
          expectDigits(standing?.[key], golden[key], 9, key);
        }
        if (golden.ownPersistence === null) expect(standing?.ownPersistence).toBeNull();
        else expectDigits(standing?.ownPersistence, golden.ownPersistence, 9, 'own persistence');
        expect(standing?.cosines).toBe(cosines);
        expect(standing?.rank).toBe(golden.rank);
        expect(standing?.rankSet).toEqual(golden.rankSet);
      });
    }
  });
}

for (const golden of goldenJson<GapAndDrift>('gap-drift.json').cases) {
  describe(`${golden.own} in ${golden.file}`, () => {
    const fit = fitOf(goldenPanel(golden.file, golden.outcome, golden.regressors), golden.own);

    it('has the gap path of the dense computation', () => {
      expect(fit.gapPath?.map(({ year, peers }) => [year, peers])).toEqual(
        golden.gapPath.map(({ year, peers }) => [year, peers]),
      );
      golden.gapPath.forEach(({ gap, year }, index) => {
        expectDigits(fit.gapPath?.[index].gap, gap!, 9, String(year));
      });
    });

    it('has the drift of the dense augmented fit', () => {
      expectDigits(fit.drift?.estimate, golden.drift.estimate, 9, 'estimate');
      expectDigits(fit.drift?.standardError, golden.drift.standardError, 9, 'standard error');
    });

    it('has the pair comparisons of the dense computation', () => {
      expect(fit.pairs?.length).toBe(Object.keys(golden.pairs).length);
      for (const pair of fit.pairs ?? []) {
        expectDigits(pair.estimate, golden.pairs[pair.company].estimate, 9, pair.company);
        expectDigits(pair.standardError, golden.pairs[pair.company].standardError, 9, pair.company);
      }
    });

    it('has the expected values of the dense computation from λ, A and D', () => {
      for (const expected of golden.expected) {
        const value = fit.prediction && expectedValue(fit.prediction, expected.regressors);
        expectDigits(value?.estimate, expected.estimate, 9, 'estimate');
        expectDigits(value?.standardError, expected.standardError, 9, 'standard error');
      }
    });

    it('has the intercepts’ standard errors of the dense computation', () => {
      for (const { company, standardError } of fit.intercepts) {
        expectDigits(standardError, golden.interceptStandardErrors[company], 9, company);
      }
    });
  });
}

describe('a drift', () => {
  const random = randomNumbers(3);
  const rows = ['A', 'B', 'C', 'D'].flatMap((company, index) =>
    Array.from({ length: 10 }, (_, year): PanelRow => {
      const x = 100 * random();
      const slope = company === 'A' ? 3 : 1;
      const outcome = 10 * index + 2 * x + slope * year;
      return { company, year: 2000 + year, outcome, regressors: [x] };
    }),
  );
  const names = { outcome: 'y', regressors: ['x'] };

  it('has neither interval nor p where it leaves no residual', () => {
    const { drift } = fitOf(panelOf(rows, names), 'A');
    expectDigits(drift?.estimate, 2, 9);
    expect(drift).toEqual(
      jasmine.objectContaining({ standardError: null, low: null, high: null, pValue: null }),
    );
    expect(drift?.intervalReason).toContain('perfect');
  });

  it('is not told from regressors that run in a straight line over time', () => {
    const noisy = rows.map((row) => ({
      ...row,
      outcome: row.outcome + 9 * random(),
      regressors: [row.year],
    }));
    const fit = fitOf(panelOf(noisy, names), 'A');
    expect(fit.drift).toBeNull();
    expect(fit.driftReason).toContain('straight line');
  });

  it('needs rows for two more slopes, and says so', () => {
    const few = rows.filter(({ company, year }) => company === 'A' || year < 2002).slice(0, 12);
    const wide = few.map((row) => ({
      ...row,
      regressors: Array.from({ length: 8 }, () => random()),
    }));
    const regressors = wide[0].regressors.map((_, k) => `x${k}`);
    const fit = fitOf(panelOf(wide, { outcome: 'y', regressors }), 'A');
    expect(fit.drift).toBeNull();
    expect(fit.driftReason).toBe(
      'The rows are too few for the two more slopes that a drift needs.',
    );
  });
});

describe('a rank', () => {
  it('is none where no peer has rows enough to be compared with', () => {
    const random = randomNumbers(11);
    const rows = ['A', 'B', 'C'].flatMap((company) =>
      Array.from({ length: company === 'A' ? 20 : 2 }, (_, year): PanelRow => {
        const regressors = [random()];
        return { company, year: 2000 + year, outcome: random(), regressors };
      }),
    );
    const { standing } = fitOf(panelOf(rows, { outcome: 'y', regressors: ['x'] }), 'A');
    expect(standing?.rank).toBeNull();
    expect(standing?.rankSet).toBeNull();
    expect(standing?.rankReason).toBe(
      'No peer has 3 rows or more, so there is no one to rank against.',
    );
  });
});
