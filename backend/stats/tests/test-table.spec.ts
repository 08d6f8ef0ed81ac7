import type { FitRequest } from '../fit-parts';
import { openFit } from '../open-fit';
import { expectDigits } from '../testing/expect-digits';
import { goldenJson, goldenPanel, plainSpecification, sha256 } from '../testing/golden-panels';
import type { EvidenceTest, TestGround, TestOutcome } from './evidence-test';
import { testTable } from './test-table';

interface Block {
  readonly statistic?: number;
  readonly parameter?: number | Readonly<Record<string, number>> | null;
  readonly p_value?: number | null;
  readonly error?: string;
}
type Blocks = Readonly<Record<string, Block | undefined>>;

interface Golden {
  readonly meta: { readonly dependent: string; readonly regressors: readonly string[] };
  readonly poolability_F: Block;
  readonly tests: Blocks;
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

const digits = 9;

const further = goldenJson<{ panels: Readonly<Record<string, Blocks>> }>('panel-tests.json').panels;
const brownForsythe = goldenJson<{ panels: Readonly<Record<string, Blocks>> }>(
  'brown-forsythe.json',
).panels;

function groundOf(file: string, effects: 'company' | 'company,year' = 'company'): TestGround {
  const { dependent, regressors } = goldenJson<Golden>(`${file}.json`).meta;
  const request: FitRequest = {
    data: goldenPanel(`${file}.csv`, dependent, regressors),
    specification: { ...plainSpecification, effects, slopes: 'classical' },
    own: null,
    members: undefined,
  };
  return openFit(request, { sha256 });
}

function testOf(code: string): EvidenceTest {
  const test = testTable.find((entry) => entry.code === code);
  if (test === undefined) throw new Error(`no test ${code}`);
  return test;
}

function parametersOf({ parameter }: Block): number[] {
  if (parameter === null || parameter === undefined) return [];
  return typeof parameter === 'number' ? [parameter] : Object.values(parameter);
}

function expectStatistic(outcome: TestOutcome, block: Block, context: string): void {
  expectDigits(outcome.statistic, block.statistic ?? NaN, digits, context);
}

/** Statistic, degrees of freedom and p value as the block has them. */
function expectAll(outcome: TestOutcome, block: Block, context: string): void {
  expectStatistic(outcome, block, context);
  if (outcome.statistic === null) return;
  expect(outcome.degreesOfFreedom).withContext(context).toEqual(parametersOf(block));
  if (typeof block.p_value === 'number')
    expectDigits(outcome.pValue, block.p_value, digits, `p of ${context}`);
}

describe('the tests of the evidence', () => {
  for (const file of files) {
    const { tests, poolability_F } = goldenJson<Golden>(`${file}.json`);
    const own = further[file];

    it(`agree with the outside results on ${file}`, () => {
      const ground = groundOf(file);
      const compute = (code: string): TestOutcome => testOf(code).compute(ground);
      expectAll(compute('poolability'), poolability_F, 'poolability');
      for (const [code, block] of [
        ['wooldridge-first-differences', 'wooldridge_fd_h0fe'],
        ['breusch-godfrey', 'breusch_godfrey_order1'],
        ['durbin-watson', 'bhargava_dw'],
        ['reset', 'reset_power2'],
      ]) {
        expectAll(compute(code), tests[block] ?? {}, code);
      }
      // The package's own p value is of F(1, n − N − K); ours of F(1, N − 1), which R's pf gives in the other block.
      const within = compute('wooldridge-within');
      expectStatistic(within, tests['wooldridge_within_pwartest'] ?? {}, 'Wooldridge');
      expectAll(within, own['wooldridge_within_companies'] ?? {}, 'Wooldridge from companies');
      expectAll(compute('brown-forsythe'), brownForsythe[file]['brown_forsythe'] ?? {}, 'BF');
      expectAll(compute('pesaran-cd'), own['pesaran_cd_three_years'] ?? {}, 'CD');
    });

    it(`agree with the outside results on ${file} with year effects`, () => {
      const ground = groundOf(file, 'company,year');
      const compute = (code: string): TestOutcome => testOf(code).compute(ground);
      expectStatistic(compute('wooldridge-within'), own['wooldridge_within_years'] ?? {}, 'w');
      expectAll(compute('breusch-godfrey'), own['breusch_godfrey_years'] ?? {}, 'BG');
      expectAll(compute('durbin-watson'), own['bhargava_dw_years'] ?? {}, 'DW');
      expectAll(compute('reset'), own['reset_power2_years'] ?? {}, 'RESET');
      expectAll(compute('brown-forsythe'), brownForsythe[file]['brown_forsythe_years'] ?? {}, 'BF');
      for (const code of ['slope-homogeneity', 'wooldridge-first-differences', 'pesaran-cd']) {
        expect(compute(code)).toEqual({
          statistic: null,
          reason: jasmine.stringMatching('year effects'),
        });
      }
    });

    it(`give slope homogeneity and the modified Wald test where every company of ${file} has the rows`, () => {
      const ground = groundOf(file);
      const homogeneity = testOf('slope-homogeneity').compute(ground);
      const wald = testOf('modified-wald').compute(ground);
      const block = tests['slope_homogeneity_F'] ?? {};
      if (block.error === undefined) expectAll(homogeneity, block, 'slope homogeneity');
      else expect(homogeneity.statistic).toBeNull();
      const years = own['modified_wald_years'];
      if (years === undefined) expect(wald.statistic).toBeNull();
      else {
        expectAll(wald, tests['modified_wald'] ?? {}, 'modified Wald');
        const withYears = testOf('modified-wald').compute(groundOf(file, 'company,year'));
        expectAll(withYears, years, 'modified Wald with year effects');
      }
    });
  }

  it('count pairs with two common years out of Pesaran’s CD, unlike the block of the panel package', () => {
    const cd = testOf('pesaran-cd').compute(groundOf('grunfeld10_unbalanced'));
    const { tests } = goldenJson<Golden>('grunfeld10_unbalanced.json');
    // No pair of this panel has one or two years in common: the two definitions agree.
    expectAll(cd, { ...tests['pesaran_cd'], parameter: null }, 'CD');
    const short = testOf('pesaran-cd').compute(groundOf('instinnovation120'));
    const block = goldenJson<Golden>('instinnovation120.json').tests['pesaran_cd'];
    expect(Math.abs((short.statistic ?? 0) - (block?.statistic ?? 0))).toBeGreaterThan(0.1);
  });
});
