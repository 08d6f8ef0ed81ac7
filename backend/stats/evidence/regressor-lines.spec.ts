import { openFit, type PanelColumns } from '../index';
import type { OpenFit } from '../fit-parts';
import { expectDigits } from '../testing/expect-digits';
import {
  goldenJson,
  goldenPanel,
  panelOf,
  type PanelRow,
  plainSpecification,
  sha256,
} from '../testing/golden-panels';
import { mostCompanyLines, regressorLines } from './regressor-lines';

const open = (data: PanelColumns, own: string | null = null): OpenFit =>
  openFit({ data, specification: plainSpecification, own, members: undefined }, { sha256 });

const slopeOf = ({
  from,
  to,
}: {
  from: readonly [number, number];
  to: readonly [number, number];
}): number => (to[1] - from[1]) / (to[0] - from[0]);

describe('regressorLines', () => {
  const data = goldenPanel('grunfeld10_unbalanced.csv', 'inv', ['value', 'capital']);
  const { fit, pooled, sample } = open(data);
  const lines = regressorLines(fit, pooled, -1);
  const mean = (values: Float64Array, from: number, to: number): number =>
    values.subarray(from, to).reduce((sum, value) => sum + value, 0) / (to - from);

  it('gives each company a line through its means, of the fixed effects slope, over its own range', () => {
    lines.forEach((picture, k) => {
      expect(picture.of).toBe(10);
      picture.companies.forEach((line, company) => {
        const [from, to] = [sample.starts[company], sample.starts[company + 1]];
        const values = sample.regressors[k].subarray(from, to);
        expect([line.from[0], line.to[0]]).toEqual([Math.min(...values), Math.max(...values)]);
        const slope = slopeOf(line);
        expectDigits(slope, fit.slopes[k], 9, line.company);
        const atMean = line.from[1] + slope * (mean(values, 0, values.length) - line.from[0]);
        expectDigits(atMean, mean(sample.outcome, from, to), 9, line.company);
      });
    });
  });

  it('gives the pooled line the slope of R’s pooled regression (pooled_ols), through the means of all rows', () => {
    const golden = goldenJson<{ pooled_ols: { coef: Record<string, number> } }>(
      'grunfeld10_unbalanced.json',
    ).pooled_ols.coef;
    lines.forEach((picture, k) => {
      const slope = slopeOf(picture.pooled);
      expectDigits(slope, golden[picture.regressor], 9);
      const rows = sample.outcome.length;
      const atMean =
        picture.pooled.from[1] +
        slope * (mean(sample.regressors[k], 0, rows) - picture.pooled.from[0]);
      expectDigits(atMean, mean(sample.outcome, 0, rows), 9);
    });
  });

  it('keeps at most 500 lines, the own company’s among them, and says how many companies there are', () => {
    const rows = Array.from({ length: 1400 }, (_, index): PanelRow => {
      const x = (index * 37) % 101;
      const company = `K${String(Math.floor(index / 2)).padStart(3, '0')}`;
      return {
        company,
        year: 2000 + (index % 2),
        outcome: x + ((index * 13) % 7),
        regressors: [x],
      };
    });
    const large = open(panelOf(rows, { outcome: 'y', regressors: ['x'] }), 'K699');
    const [picture] = regressorLines(large.fit, large.pooled, large.ownIndex);
    expect(picture.companies.length).toBe(mostCompanyLines);
    expect(picture.of).toBe(700);
    const names = picture.companies.map(({ company }) => company);
    expect(names).toContain('K699');
    expect(new Set(names).size).toBe(mostCompanyLines);
    expect([...names].sort()).toEqual(names);
  });
});
