import type { EstimatorSummary } from '../evidence/evidence';
import type { Specification } from '../fit-result';
import { openFit } from '../index';
import { componentsOf, slopesOf, summariesOfPanel } from '../testing/estimator-figures';
import { expectDigits } from '../testing/expect-digits';
import { goldenJson, goldenPanel, plainSpecification, sha256 } from '../testing/golden-panels';
import { estimatorTable } from './estimator-table';

type ByName = Readonly<Record<string, number>>;

interface Block {
  readonly coef: ByName;
  readonly se: ByName;
  readonly df?: number | 'Inf';
  readonly ci95_low?: ByName;
  readonly ci95_high?: ByName;
}

interface Variances {
  readonly sigma2_idios: number;
  readonly sigma2_company: number;
}

interface Golden {
  readonly meta: {
    readonly dependent: string;
    readonly regressors: readonly string[];
    readonly balanced: boolean;
    readonly n: number;
    readonly companies: number;
  };
  readonly between: Block;
  readonly random_swar: Block & Variances & { readonly theta: number | ByName };
  readonly first_difference_no_const: Block;
}

/** Results of tools/reference/estimators.R. */
interface Further {
  readonly pooled: Block;
  readonly calendar_differences: Block & { readonly observations: number };
  readonly calendar_differences_years: Block;
  readonly random_swar_years: Block & Variances;
}
const further = goldenJson<Record<string, Further>>('estimators.json');

const files = [
  'grunfeld10',
  'grunfeld11',
  'grunfeld11_value_on_inv_capital',
  'grunfeld10_unbalanced',
  'grunfeld10_loglog',
  'usairlines',
  'instinnovation120',
];

const digits = 9;

function summariesOf(
  file: string,
  specification: Partial<Specification> = {},
): ReturnType<typeof summariesOfPanel> {
  const { meta } = goldenJson<Golden>(`${file}.json`);
  const data = goldenPanel(`${file}.csv`, meta.dependent, meta.regressors);
  return summariesOfPanel(data, specification);
}

function expectBlock(summary: EstimatorSummary, block: Block): void {
  for (const { name, estimate, standardError, low, high } of slopesOf(summary)) {
    expectDigits(estimate, block.coef[name], digits, name);
    expectDigits(standardError, block.se[name], digits, `standard error of ${name}`);
    if (block.ci95_low !== undefined && block.ci95_high !== undefined) {
      expectDigits(low, block.ci95_low[name], digits, `low of ${name}`);
      expectDigits(high, block.ci95_high[name], digits, `high of ${name}`);
    }
  }
  if (block.coef['(Intercept)'] !== undefined) {
    expectDigits(summary.constant, block.coef['(Intercept)'], digits, 'constant');
  }
  if (typeof block.df === 'number') expect(summary.degreesOfFreedom).toBe(block.df);
}

for (const file of files) {
  const golden = goldenJson<Golden>(`${file}.json`);

  describe(`estimators on ${file}`, () => {
    const summary = summariesOf(file);

    it('agree with R on the between estimator', () => {
      expectBlock(summary('between'), golden.between);
      expect(summary('between').observations).toBe(golden.meta.companies);
    });

    it('agree with R on random effects, their variances and θ', () => {
      const random = summary('random-effects');
      const block = golden.random_swar;
      expectBlock(random, block);
      expect(random.degreesOfFreedom).toBeNull();
      expect(random.reason).toBeUndefined();
      const { error, company, theta } = componentsOf(random);
      expectDigits(error ** 2, block.sigma2_idios, digits, 'variance of the errors');
      expectDigits(company ** 2, block.sigma2_company, digits, 'variance of the companies');
      const shares = typeof block.theta === 'number' ? [block.theta] : Object.values(block.theta);
      expectDigits(theta[0], Math.min(...shares), digits, 'smallest θ');
      expectDigits(theta[1], Math.max(...shares), digits, 'largest θ');
    });

    if (golden.meta.balanced) {
      it('agree with R on first differences', () => {
        expectBlock(summary('first-differences'), golden.first_difference_no_const);
      });
    }

    it('repeat the slopes of the fit as fixed effects', () => {
      const { meta } = golden;
      const { result } = openFit(
        {
          data: goldenPanel(`${file}.csv`, meta.dependent, meta.regressors),
          specification: plainSpecification,
          own: null,
          members: undefined,
        },
        { sha256 },
      );
      const fixed = summary('fixed-effects');
      expect(slopesOf(fixed).map(({ low, high }) => [low, high])).toEqual(
        result.slopes.map(({ low, high }) => [low, high]),
      );
      expect(fixed.observations).toBe(meta.n);
    });
  });
}

for (const file of Object.keys(further).filter((name) => name !== 'versions')) {
  describe(`estimators beside R’s lm and plm on ${file}`, () => {
    const blocks = further[file];
    const summary = summariesOf(file);
    const withYears = summariesOf(file, { effects: 'company,year' });

    it('agree on the pooled standard errors', () => {
      expectBlock(summary('pooled'), blocks.pooled);
    });

    it('take differences over consecutive calendar years only', () => {
      const differences = summary('first-differences');
      expectBlock(differences, blocks.calendar_differences);
      expect(differences.observations).toBe(blocks.calendar_differences.observations);
    });

    it('give every year of a change its own constant with year effects', () => {
      expectBlock(withYears('first-differences'), blocks.calendar_differences_years);
    });

    it('agree on random effects with year effects', () => {
      const random = withYears('random-effects');
      const block = blocks.random_swar_years;
      expectBlock(random, block);
      expectDigits(componentsOf(random).error ** 2, block.sigma2_idios, digits, 'errors');
      expectDigits(componentsOf(random).company ** 2, block.sigma2_company, digits, 'companies');
    });
  });
}

describe('first differences over gaps', () => {
  // The figures of the methods page, from R's lm on calendar differences, to the digits it prints.
  it('keep the printed figures of the panel with gaps', () => {
    const differences = summariesOf('grunfeld10_unbalanced')('first-differences');
    const slopes = slopesOf(differences);
    expect(differences.observations).toBe(157);
    expect(slopes.map(({ estimate }) => estimate.toFixed(8))).toEqual(['0.07993073', '0.31828203']);
    expect(slopes.map(({ standardError }) => standardError?.toFixed(8))).toEqual([
      '0.00832162',
      '0.04713000',
    ]);
  });

  it('keep the printed figures of the panel of 120 companies', () => {
    const differences = summariesOf('instinnovation120')('first-differences');
    const slopes = slopesOf(differences);
    expect(differences.observations).toBe(814);
    expect(slopes.map(({ estimate }) => estimate.toFixed(7))).toEqual(['0.1446256', '0.0433075']);
    expect(slopes.map(({ standardError }) => standardError?.toFixed(7))).toEqual([
      '0.0417489',
      '0.0688210',
    ]);
  });
});

describe('the estimators with year effects', () => {
  it('leave the between estimator as it is where all companies have the same years', () => {
    const plain = summariesOf('grunfeld10')('between');
    const years = summariesOf('grunfeld10', { effects: 'company,year' })('between');
    expect(years).toEqual(plain);
  });

  it('say why there is none where companies have different years', () => {
    const years = summariesOf('grunfeld10_unbalanced', { effects: 'company,year' });
    expect(years('between').slopes).toBeNull();
    expect(years('between').reason).toMatch(/without year effects/u);
    expect(years('pooled').reason).toMatch(/[Ww]ithout the year effects/u);
  });
});

describe('the table of estimators', () => {
  it('names each with its definition in a sentence, its source and its reference', () => {
    expect(new Set(estimatorTable.map(({ code }) => code)).size).toBe(estimatorTable.length);
    for (const { definition, source, reference } of estimatorTable) {
      expect(definition).toMatch(/^[A-Z].*\.$/u);
      expect(source).toMatch(/\(\d{4}\)/u);
      expect(Object.keys(goldenJson<object>('grunfeld10.json'))).toContain(reference);
    }
  });
});
