import type { OpenFit } from '../fit-parts';
import { openFit } from '../open-fit';
import type { SlopeCovarianceName, SlopeEstimate, Specification } from '../fit-result';
import { expectDigits } from '../testing/expect-digits';
import { goldenJson, goldenPanel, plainSpecification, sha256 } from '../testing/golden-panels';
import { covarianceTable } from './covariance-table';
import { bartlettLag, driscollKraayCovariance } from './covariances/driscoll-kraay';

type ByName = Readonly<Record<string, number>>;

/** What R says of one covariance; the two-way CR2 block holds neither coefficients nor intervals. */
interface Block {
  readonly coef?: ByName;
  readonly se: ByName;
  readonly p: ByName;
  readonly df: number | ByName;
  readonly t?: ByName;
  readonly ci95_low?: ByName;
  readonly ci95_high?: ByName;
  readonly vcov?: { readonly values: readonly (readonly number[])[] };
}

interface Golden {
  readonly meta: {
    readonly dependent: string;
    readonly regressors: readonly string[];
    readonly periods: number;
  };
  readonly within_se: Readonly<Record<string, Block>>;
  readonly twoway: Readonly<Record<string, Block>>;
}

const files = [
  'grunfeld10',
  'grunfeld11',
  'grunfeld11_value_on_inv_capital',
  'grunfeld10_unbalanced',
  'grunfeld10_loglog',
  'usairlines',
  'instinnovation120',
];

const withinBlocks: Readonly<Partial<Record<SlopeCovarianceName, string>>> = {
  cr2: 'CR2_satterthwaite',
  cr1: 'CR1_nested',
  cr0: 'CR0_company',
  classical: 'classical',
  hc0: 'HC0_lsdv',
  hc1: 'HC1_lsdv',
  hc2: 'HC2_lsdv',
  hc3: 'HC3_lsdv',
  'two-way': 'twoway_cluster_plm',
};

const twoWayBlocks: Readonly<Partial<Record<SlopeCovarianceName, string>>> = {
  cr2: 'CR2_satterthwaite',
  cr1: 'CR1_nested',
  cr0: 'CR0_company',
  classical: 'classical',
  hc0: 'white_HC0',
  hc1: 'HC1_lsdv2',
  hc3: 'HC3_lsdv2',
};

const digits = 9;

for (const file of files) {
  const golden = goldenJson<Golden>(`${file}.json`);
  const { dependent, regressors, periods } = golden.meta;
  const data = goldenPanel(`${file}.csv`, dependent, regressors);
  const open = (specification: Partial<Specification>): OpenFit =>
    openFit(
      {
        data,
        specification: { ...plainSpecification, ...specification },
        own: null,
        members: undefined,
      },
      { sha256 },
    );

  describe(`the covariances of the slopes on ${file}`, () => {
    for (const [slopes, block] of Object.entries(withinBlocks)) {
      it(`agree with R on ${slopes}`, () => {
        const { result } = open({ slopes: slopes as SlopeCovarianceName });
        expectBlock(result.slopes, result.slopeCovariance, golden.within_se[block]);
      });
    }

    for (const [slopes, block] of Object.entries(twoWayBlocks)) {
      it(`agree with R on ${slopes} with year effects`, () => {
        const { inference, fit } = open({
          slopes: slopes as SlopeCovarianceName,
          effects: 'company,year',
        });
        const size = fit.slopes.length;
        const { covariance } = inference;
        const rows =
          covariance === null
            ? null
            : regressors.map((_, k) => [...covariance.subarray(k * size, (k + 1) * size)]);
        expectBlock(inference.slopes, rows, golden.twoway[block]);
      });
    }

    it('agree with R on driscoll-kraay, at each lag and at the one that the years give', () => {
      const { ground, result } = open({ slopes: 'driscoll-kraay' });
      for (const lag of [1, 2, 3]) {
        const block = golden.within_se[`driscoll_kraay_L${lag}`] as Block | undefined;
        if (block === undefined) continue;
        const covariance = driscollKraayCovariance(ground, lag);
        block.vcov?.values.flat().forEach((value, index) => {
          expectDigits(covariance[index], value, digits, `lag ${lag}, entry ${index}`);
        });
      }
      const lag = bartlettLag(periods);
      expectBlock(
        result.slopes,
        result.slopeCovariance,
        golden.within_se[`driscoll_kraay_L${lag}`],
      );
    });
  });
}

function expectBlock(
  slopes: readonly SlopeEstimate[],
  covariance: readonly (readonly number[])[] | null,
  block: Block,
): void {
  slopes.forEach((slope, k) => {
    const { name } = slope;
    const df = typeof block.df === 'number' ? block.df : block.df[name];
    expectDigits(slope.standardError, block.se[name], digits, `standard error of ${name}`);
    expectDigits(slope.degreesOfFreedom, df, digits, `degrees of freedom of ${name}`);
    expectDigits(slope.pValue, block.p[name], digits, `p of ${name}`);
    if (block.coef) expectDigits(slope.estimate, block.coef[name], digits, name);
    if (block.t) expectDigits(slope.statistic, block.t[name], digits, `t of ${name}`);
    if (block.ci95_low) expectDigits(slope.low, block.ci95_low[name], digits, `low of ${name}`);
    if (block.ci95_high) expectDigits(slope.high, block.ci95_high[name], digits, `high of ${name}`);
    block.vcov?.values[k].forEach((value, l) => {
      expectDigits(covariance?.[k][l], value, digits, `covariance ${k}, ${l}`);
    });
  });
}

describe('the table of covariances', () => {
  it('names every entry by its own code, with its definition, source and outside result', () => {
    for (const [name, method] of Object.entries(covarianceTable)) {
      expect(method.code as string).toBe(name);
      expect(method.definition).toMatch(/\.$/u);
      expect(method.source).toMatch(/\(\d{4}\)/u);
      expect(method.reference.length).toBeGreaterThan(0);
    }
  });

  it('takes floor(T^¼) as the lag, exact at fourth powers', () => {
    expect([2, 15, 16, 20, 80, 81, 255, 256].map(bartlettLag)).toEqual([1, 1, 2, 2, 2, 3, 3, 4]);
  });
});
