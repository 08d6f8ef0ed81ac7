import { openFit } from '../open-fit';
import type { WithinFit } from '../regression/within-fit';
import type { PanelColumns } from '../fit-result';
import { expectDigits } from '../testing/expect-digits';
import {
  goldenJson,
  goldenPanel,
  panelOf,
  type PanelRow,
  plainSpecification,
  sha256,
} from '../testing/golden-panels';
import { mostResidualPoints, residualSummary } from './residual-summary';

function fitFor(data: PanelColumns): WithinFit {
  const request = {
    data,
    specification: { ...plainSpecification, slopes: 'classical' as const },
    own: null,
    members: undefined,
  };
  return openFit(request, { sha256 }).fit;
}

interface Golden {
  readonly tests: {
    readonly modified_wald: { readonly per_company_mean_e2: Readonly<Record<string, number>> };
  };
  readonly influence: {
    readonly top10_cooks: readonly { readonly company: string; readonly year: string }[];
  };
}

describe('the summary of residuals', () => {
  const fit = fitFor(goldenPanel('grunfeld10_unbalanced.csv', 'inv', ['value', 'capital']));
  const golden = goldenJson<Golden>('grunfeld10_unbalanced.json');
  const summary = residualSummary({ fit });

  it('has each company’s mean squared residual as R has it', () => {
    expect(summary.byCompany.length).toBe(10);
    for (const { label, standardDeviation } of summary.byCompany) {
      const square = golden.tests.modified_wald.per_company_mean_e2[label];
      expectDigits(standardDeviation, Math.sqrt(square), 9, label);
    }
  });

  it('counts every row once by company and once by year', () => {
    const count = (groups: readonly { readonly count: number }[]): number =>
      groups.reduce((sum, group) => sum + group.count, 0);
    expect(count(summary.byCompany)).toBe(168);
    expect(count(summary.byYear)).toBe(168);
    expect(summary.byYear.map(({ label }) => label)).toEqual(fit.sample.years.map(String));
    const total = summary.byYear.reduce((sum, { count: rows, mean }) => sum + rows * mean, 0);
    expect(Math.abs(total)).toBeLessThan(1e-8);
  });

  it('gives the largest of each company and year with its sign', () => {
    const { largest: rows } = summary;
    const [first] = rows;
    const group = summary.byCompany.find(({ label }) => label === first.company);
    const year = summary.byYear.find(({ label }) => label === String(first.year));
    for (const found of [group, year]) expect(found?.largest).toBe(first.residual);
    expect(summary.byCompany.some(({ largest }) => largest < 0)).toBeTrue();
    expect(summary.byCompany.some(({ largest }) => largest > 0)).toBeTrue();
  });

  it('names the largest with their cells of the panel, largest first', () => {
    expect(summary.of).toBe(168);
    expect(summary.points.length).toBe(168);
    expect(summary.largest.length).toBe(20);
    const sizes = summary.largest.map(({ studentised }) => Math.abs(studentised ?? 0));
    expect(sizes).toEqual([...sizes].sort((left, right) => right - left));
    const [first] = summary.largest;
    expect([first.company, first.year]).toEqual(['F01', 1954]);
    expect(first.actual - first.fitted).toBeCloseTo(first.residual, 9);
    // The file's header is line 1, F01's last row the 20th.
    expect(first.fileRow).toBe(21);
    const { company, year } = golden.influence.top10_cooks[0];
    expect([first.company, String(first.year)]).toEqual([company, year]);
  });

  it('keeps the largest of very many rows, in the order of the sample', () => {
    const rows: PanelRow[] = Array.from({ length: 600 }, (_, company) =>
      Array.from({ length: 10 }, (__, year) => {
        const x = (company * 7 + year * 11 + ((year * company) % 13)) % 29;
        const noise = ((company * 19 + year * 5 + ((company * year * year) % 17)) % 31) - 15;
        return { company: `K${company}`, year, regressors: [x], outcome: x + noise };
      }),
    ).flat();
    const many = residualSummary({
      fit: fitFor(panelOf(rows, { outcome: 'y', regressors: ['x'] })),
    });
    expect(many.of).toBe(6000);
    expect(many.points.length).toBe(mostResidualPoints);
    const keys = many.points.map(({ company, year }) => `${company} ${year}`);
    expect(new Set(keys).size).toBe(mostResidualPoints);
    expect(keys).toEqual([...keys].sort((left, right) => (left < right ? -1 : 1)));
    for (const { company, year } of many.largest) expect(keys).toContain(`${company} ${year}`);
  });

  it('leaves studentised residuals and distances of a perfect fit open', () => {
    const rows = ['A', 'B'].flatMap((company, index) =>
      [1, 4, 2, 8].map((x, year) => ({
        company,
        year,
        regressors: [x + index],
        outcome: 3 * x + index,
      })),
    );
    const perfect = residualSummary({
      fit: fitFor(panelOf(rows, { outcome: 'y', regressors: ['x'] })),
    });
    for (const point of perfect.points) {
      expect(point.studentised).toBeNull();
      expect(point.cook).toBeNull();
    }
    expect(perfect.varianceInflation[0].value).toBeCloseTo(1, 12);
  });
});
