import { estimatorSummaries } from '../estimators/estimator-summaries';
import { openFit, type PanelColumns, type Specification } from '../index';
import { expectDigits } from '../testing/expect-digits';
import {
  fitOf,
  goldenJson,
  goldenPanel,
  panelOf,
  plainSpecification,
  sha256,
} from '../testing/golden-panels';
import { randomNumbers } from '../testing/random-panels';
import { alternativesOf } from './alternatives';
import type { Alternative, AlternativeCode } from './evidence';

type ByName = Readonly<Record<string, number>>;

interface Block {
  readonly coef: ByName;
  readonly se: ByName;
  readonly ci95_low: ByName;
}

interface Golden {
  readonly meta: { readonly dependent: string; readonly regressors: readonly string[] };
  readonly pooled_ols: { readonly coef: ByName };
  readonly random_swar: Block;
  readonly within_se: { readonly classical: Block };
  readonly twoway: {
    readonly classical: Block;
    readonly CR2_satterthwaite: Pick<Block, 'se'>;
    readonly company_effects_dev_unweighted: ByName;
  };
}

interface GoldenStandings {
  readonly results: readonly {
    readonly file: string;
    readonly standings: Readonly<
      Record<string, { estimate: number; low: number; high: number; rankSet: [number, number] }>
    >;
  }[];
}

function alternatives(
  data: PanelColumns,
  own: string | null,
  change: Partial<Specification> = {},
): ReadonlyMap<AlternativeCode, Alternative> {
  const specification = { ...plainSpecification, ...change };
  const open = openFit({ data, specification, own, members: undefined }, { sha256 });
  return new Map(alternativesOf(open, estimatorSummaries(open)).map((one) => [one.code, one]));
}

function expectSlopes(
  alternative: Alternative | undefined,
  block: { readonly coef: ByName; readonly se?: ByName; readonly ci95_low?: ByName },
): void {
  expect(alternative?.slopes?.length).toBeGreaterThan(0);
  for (const slope of alternative?.slopes ?? []) {
    expectDigits(slope.estimate, block.coef[slope.name], 9, slope.name);
    if (block.se) expectDigits(slope.standardError, block.se[slope.name], 8, slope.name);
    if (block.ci95_low) expectDigits(slope.low, block.ci95_low[slope.name], 8, slope.name);
  }
}

describe('alternatives', () => {
  for (const file of [
    'grunfeld10',
    'grunfeld10_unbalanced',
    'grunfeld11',
    'usairlines',
    'instinnovation120',
  ]) {
    const golden = goldenJson<Golden>(`${file}.json`);
    const { dependent, regressors } = golden.meta;
    const data = goldenPanel(`${file}.csv`, dependent, regressors);
    const own = data.companies[0];
    const effects = golden.twoway.company_effects_dev_unweighted;

    it(`of ${file} hold R’s two-way within regression (block twoway)`, () => {
      const classical = alternatives(data, own, { slopes: 'classical' }).get('year-effects');
      expectSlopes(classical, golden.twoway.classical);
      const { coef } = golden.twoway.classical;
      const cr2 = alternatives(data, own).get('year-effects');
      expectSlopes(cr2, { coef, se: golden.twoway.CR2_satterthwaite.se });
      const companies = data.companies.length;
      expectDigits(cr2?.standing?.estimate, (effects[own] * companies) / (companies - 1), 8);
    });

    it(`of ${file} hold R’s pooled and random effects (pooled_ols, random_swar)`, () => {
      const found = alternatives(data, own);
      expectSlopes(found.get('pooled'), golden.pooled_ols);
      expectSlopes(found.get('random-effects'), golden.random_swar);
    });
  }

  const grunfeld = goldenPanel('grunfeld10.csv', 'inv', ['value', 'capital']);

  it('hold R’s regression in logs (grunfeld10_loglog, within_se) and its standings (standing.json) as percent', () => {
    const { classical } = goldenJson<Golden>('grunfeld10_loglog.json').within_se;
    const inLogs = (block: ByName): ByName => ({
      value: block['log_value'],
      capital: block['log_capital'],
    });
    const outside = goldenJson<GoldenStandings>('standing.json').results.find(
      (one) => one.file === 'grunfeld10_loglog.csv',
    );
    for (const own of ['F01', 'F07']) {
      const log = alternatives(grunfeld, own, { slopes: 'classical' }).get('log-form');
      expectSlopes(log, { coef: inLogs(classical.coef), se: inLogs(classical.se) });
      const standing = outside?.standings[own];
      expect(log?.standingUnit).toBe('percent');
      for (const key of ['estimate', 'low', 'high'] as const) {
        expectDigits(log?.standing?.[key], 100 * Math.expm1(standing?.[key] ?? NaN), 8, key);
      }
      expect(log?.standing?.standardError).toBeNull();
      expect(log?.rankSet).toEqual(standing?.rankSet ?? null);
    }
  });

  it('equal a fit of their own specification in slopes, standing and rank set', () => {
    const changes: readonly (readonly [AlternativeCode, Partial<Specification>])[] = [
      ['fixed-effects', {}],
      ['year-effects', { effects: 'company,year' }],
      ['lag', { lag: 1 }],
    ];
    const found = alternatives(grunfeld, 'F03', { form: 'log', slopes: 'cr1' });
    for (const [code, change] of changes) {
      const fit = fitOf(grunfeld, 'F03', { ...change, slopes: 'cr1' });
      const alternative = found.get(code);
      expect(alternative?.observations).toBe(fit.sample.observations);
      fit.slopes.forEach(({ estimate, low, high }, k) => {
        expect(alternative?.slopes?.[k]).toEqual(jasmine.objectContaining({ estimate, low, high }));
      });
      const { estimate, low, high } = fit.standing!;
      expect(alternative?.standing).toEqual(jasmine.objectContaining({ estimate, low, high }));
      expect(alternative?.rankSet).toEqual(fit.standing!.rankSet);
    }
    expect(
      [...found.values()].filter(({ isThisFit }) => isThisFit).map(({ code }) => code),
    ).toEqual(['log-form']);
  });

  it('list a specification that combines several of them as a row of its own, first', () => {
    const rows = [...alternatives(grunfeld, 'F03', { effects: 'company,year', lag: 1 }).values()];
    expect(rows.map(({ code }) => code)).toEqual([
      'this-fit',
      'pooled',
      'fixed-effects',
      'year-effects',
      'log-form',
      'lag',
      'random-effects',
    ]);
    expect(rows.filter(({ isThisFit }) => isThisFit)).toEqual([rows[0]]);
    const fit = fitOf(grunfeld, 'F03', { effects: 'company,year', lag: 1 });
    expect(rows[0].standing?.estimate).toBe(fit.standing!.estimate);
  });

  it('say why pooled and random effects have no standing', () => {
    const found = alternatives(grunfeld, 'F03');
    expect(found.get('pooled')?.standing).toBeNull();
    expect(found.get('pooled')?.standingReason).toBe(
      'One constant for all companies places none of them.',
    );
    expect(found.get('random-effects')?.standingReason).toContain('drawn from one distribution');
  });

  it('say why a model cannot be estimated', () => {
    const data = {
      ...grunfeld,
      outcome: { name: 'inv', values: grunfeld.outcome.values.map((value) => value - 100) },
    };
    const log = alternatives(data, 'F03').get('log-form');
    expect(log?.slopes).toBeNull();
    expect(log?.reason).toContain(
      'This model cannot be estimated: the log form needs numbers above zero; found',
    );
  });

  it('say that there is no standing without an own company, or with one of too few rows in that model', () => {
    expect(alternatives(grunfeld, null).get('year-effects')?.standingReason).toBe(
      'No own company is named, so there is no standing.',
    );
    const rows = ['K0', 'K1', 'K2', 'K3'].flatMap((company, place) =>
      Array.from({ length: company === 'K0' ? 2 : 8 }, (_, year) => ({
        company,
        year: 2000 + year,
        outcome: ((7 * year + 3 * place) % 5) + 1,
        regressors: [((5 * year + place) % 7) + 1],
      })),
    );
    const short = panelOf(rows, { outcome: 'y', regressors: ['x'] });
    expect(alternatives(short, 'K0').get('lag')?.standingReason).toBe(
      'K0 has fewer than two complete rows in this model; a standing needs at least two.',
    );
  });

  it('take CR2 in place of the bootstrap, and say so', () => {
    const found = alternatives(grunfeld, 'F03', { slopes: 'wild', seed: 1 });
    const plain = alternatives(grunfeld, 'F03');
    expect(found.get('lag')?.slopes).toEqual(plain.get('lag')?.slopes ?? null);
    expect(found.get('lag')?.slopesNote).toContain('CR2 here');
    expect(found.get('fixed-effects')?.slopesNote).toBeUndefined();
    expect(found.get('fixed-effects')?.slopes).not.toEqual(
      plain.get('fixed-effects')?.slopes ?? null,
    );
  });

  it('leave year effects alone where their columns make a sample too large', () => {
    const rows = Array.from({ length: 4000 }, (_, index) => ({
      company: `K${index % 8}`,
      year: 1 + Math.floor(index / 8),
      outcome: (index * 37) % 101,
      regressors: [(index * 53) % 97],
    }));
    const found = alternatives(panelOf(rows, { outcome: 'y', regressors: ['x'] }), 'K0');
    expect(found.get('year-effects')?.slopes).toBeNull();
    expect(found.get('year-effects')?.reason).toBe(
      'Year effects take 499 more columns beside 4000 rows: choose them in the specification to fit this model.',
    );
  });

  it('leave the rank set out where comparing every pair takes too long, and say so', () => {
    const random = randomNumbers(5);
    const rows = Array.from({ length: 6000 }, (_, index) => ({
      company: `K${index % 100}`,
      year: 1 + Math.floor(index / 100),
      outcome: random(),
      regressors: [random()],
    }));
    const found = alternatives(panelOf(rows, { outcome: 'y', regressors: ['x'] }), 'K0');
    const years = found.get('year-effects');
    expect(years?.standing?.low).not.toBeNull();
    expect(years?.rankSet).toBeNull();
    expect(years?.rankReason).toBe(
      '6000 rows and 60 columns are too many to compare every pair beside the fit.',
    );
    expect(found.get('fixed-effects')?.rankSet).not.toBeNull();
  });
});
