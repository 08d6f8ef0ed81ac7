import { openFit } from '../open-fit';
import type { WithinFit } from '../regression/within-fit';
import { expectDigits } from '../testing/expect-digits';
import {
  goldenJson,
  goldenPanel,
  panelOf,
  plainSpecification,
  sha256,
} from '../testing/golden-panels';
import { type RowInfluence, rowInfluence } from './row-influence';
import { varianceInflation } from './variance-inflation';

interface InfluenceRow {
  readonly row: number;
  readonly leverage: number;
  readonly cooks: number;
  readonly rstandard: number;
  readonly rstudent: number;
}

interface Golden {
  readonly meta: { readonly dependent: string; readonly regressors: readonly string[] };
  readonly tests: { readonly vif_within: Values };
  readonly influence: {
    readonly sum_leverage: number;
    readonly top10_cooks: readonly InfluenceRow[];
    readonly top10_leverage: readonly InfluenceRow[];
    readonly all_rows?: Readonly<Record<'leverage' | 'cooks' | 'rstudent', number[]>>;
  };
}

interface Values {
  readonly values: Readonly<Record<string, number>>;
}

interface WithYears {
  readonly vif_within_years: Values;
  readonly influence_years: { readonly rows: readonly InfluenceRow[] };
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

const { panels } = goldenJson<{ panels: Readonly<Record<string, WithYears>> }>('panel-tests.json');

function fitFor(file: string, effects: 'company' | 'company,year' = 'company'): WithinFit {
  const { dependent, regressors } = goldenJson<Golden>(`${file}.json`).meta;
  const request = {
    data: goldenPanel(`${file}.csv`, dependent, regressors),
    specification: { ...plainSpecification, effects, slopes: 'classical' as const },
    own: null,
    members: undefined,
  };
  return openFit(request, { sha256 }).fit;
}

function expectRow(influence: RowInfluence, expected: InfluenceRow): void {
  const row = expected.row - 1;
  const context = `row ${expected.row}`;
  expectDigits(influence.leverage[row], expected.leverage, digits, `leverage of ${context}`);
  expectDigits(influence.standardised[row], expected.rstandard, digits, `rstandard of ${context}`);
  expectDigits(influence.studentised[row], expected.rstudent, digits, `rstudent of ${context}`);
  expectDigits(influence.cook[row], expected.cooks, digits, `Cook of ${context}`);
}

describe('the influence of rows', () => {
  for (const file of files) {
    const golden = goldenJson<Golden>(`${file}.json`);

    it(`agrees with R on ${file}`, () => {
      const fit = fitFor(file);
      const influence = rowInfluence(fit);
      for (const expected of [...golden.influence.top10_cooks, ...golden.influence.top10_leverage])
        expectRow(influence, expected);
      const sum = influence.leverage.reduce((total, value) => total + value, 0);
      expectDigits(
        sum,
        fit.sample.companies.length + fit.slopes.length,
        digits,
        'sum of leverages',
      );
      const inflation = varianceInflation(fit);
      golden.meta.regressors.forEach((name, k) => {
        expectDigits(inflation[k], golden.tests.vif_within.values[name], digits, `VIF of ${name}`);
      });
    });

    it(`agrees with R on ${file} with year effects`, () => {
      const fit = fitFor(file, 'company,year');
      const influence = rowInfluence(fit);
      for (const expected of panels[file].influence_years.rows) expectRow(influence, expected);
      const inflation = varianceInflation(fit);
      golden.meta.regressors.forEach((name, k) => {
        const { values } = panels[file].vif_within_years;
        expectDigits(inflation[k], values[name], digits, `VIF of ${name}`);
      });
    });
  }

  it('agrees with R on every row of the unbalanced panel', () => {
    const rows = goldenJson<Golden>('grunfeld10_unbalanced.json').influence.all_rows;
    const influence = rowInfluence(fitFor('grunfeld10_unbalanced'));
    expect(rows?.leverage.length).toBe(influence.leverage.length);
    rows?.leverage.forEach((leverage, row) => {
      expectDigits(influence.leverage[row], leverage, digits, `leverage of row ${row}`);
      expectDigits(influence.cook[row], rows.cooks[row], digits, `Cook of row ${row}`);
      expectDigits(
        influence.studentised[row],
        rows.rstudent[row],
        digits,
        `rstudent of row ${row}`,
      );
    });
  });

  it('leaves the figures of a row that determines itself open', () => {
    // Only A's third row has x other than zero distance: with it the slope is determined, without it not.
    const data = panelOf(
      [
        [0, 1],
        [0, 3],
        [5, 9],
      ].map(([x, y], year) => ({ company: 'A', year, regressors: [x, year % 2], outcome: y })),
      { outcome: 'y', regressors: ['x', 'z'] },
    );
    const others = panelOf(
      ['B', 'C'].flatMap((company, index) =>
        [2, 4, 3, 7].map((outcome, year) => ({
          company,
          year,
          regressors: [0, (year + index) % 2],
          outcome: outcome + index * year,
        })),
      ),
      { outcome: 'y', regressors: ['x', 'z'] },
    );
    const both = {
      ...data,
      companies: ['A', 'B', 'C'],
      company: Int32Array.of(...data.company, ...others.company.map((code) => code + 1)),
      year: Int32Array.of(...data.year, ...others.year),
      fileRow: Int32Array.of(...data.fileRow, ...others.fileRow),
      outcome: {
        name: 'y',
        values: Float64Array.of(...data.outcome.values, ...others.outcome.values),
      },
      regressors: data.regressors.map(({ name, values }, k) => ({
        name,
        values: Float64Array.of(...values, ...others.regressors[k].values),
      })),
    };
    const request = {
      data: both,
      specification: { ...plainSpecification, slopes: 'classical' as const },
      own: null,
      members: undefined,
    };
    const influence = rowInfluence(openFit(request, { sha256 }).fit);
    expect(influence.leverage[2]).toBeCloseTo(1, 12);
    expect(influence.studentised[2]).toBeNaN();
    expect(influence.cook[2]).toBeNaN();
    expect(influence.studentised[3]).not.toBeNaN();
  });
});
