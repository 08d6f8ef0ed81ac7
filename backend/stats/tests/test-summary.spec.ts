import * as fc from 'fast-check';
import type { TestSummary } from '../evidence/evidence';
import type { PanelColumns, Specification } from '../fit-result';
import { openFit } from '../open-fit';
import { perfectFitReason } from '../regression/goodness';
import { holmRejections } from '../standing/holm';
import { expectDigits } from '../testing/expect-digits';
import {
  goldenPanel,
  panelOf,
  type PanelRow,
  plainSpecification,
  sha256,
} from '../testing/golden-panels';
import { randomPanelNames as names, randomPanels as panels } from '../testing/random-panels';
import { testSummary } from './test-summary';
import { testTable } from './test-table';

function summaryOf(data: PanelColumns, specification: Partial<Specification> = {}): TestSummary {
  const request = {
    data,
    specification: { ...plainSpecification, slopes: 'classical' as const, ...specification },
    own: null,
    members: undefined,
  };
  return testSummary(openFit(request, { sha256 }));
}

const grunfeld = goldenPanel('grunfeld10.csv', 'inv', ['value', 'capital']);

describe('the summary of the tests', () => {
  it('runs Holm’s correction over the tests with a valid p value and over no other', () => {
    const summary = summaryOf(grunfeld);
    const judged = summary.list.filter(({ holm }) => holm === 'rejects' || holm === 'keeps');
    expect(summary.lookedAt).toBe(testTable.length);
    expect(summary.inHolm).toBe(judged.length);
    expect(summary.level).toBeCloseTo(0.05, 15);
    const rejections = holmRejections(
      judged.map(({ pValue }) => pValue ?? NaN),
      0.05,
    );
    expect(judged.map(({ holm }) => holm === 'rejects')).toEqual(rejections);
    const holmOf = (code: string): string | undefined =>
      summary.list.find((test) => test.code === code)?.holm;
    expect(holmOf('breusch-godfrey')).toBe('shown-only');
    expect(holmOf('modified-wald')).toBe('shown-only');
    expect(holmOf('durbin-watson')).toBe('none');
    expect(holmOf('poolability')).toBe('rejects');
  });

  it('takes the reading of the verdict', () => {
    for (const result of summaryOf(grunfeld).list) {
      const readings = testTable.find(({ code }) => code === result.code)?.readings;
      const expected =
        result.holm === 'rejects' || result.holm === 'keeps'
          ? readings?.[result.holm]
          : readings?.none;
      expect(result.reading)
        .withContext(result.code)
        .toBe(expected ?? '');
    }
  });

  it('rejects less at a stricter level', () => {
    const count = (confidence: number): number =>
      summaryOf(grunfeld, { confidence }).list.filter(({ holm }) => holm === 'rejects').length;
    expect(count(1 - 1e-14)).toBeLessThan(count(0.95));
  });

  it('has no test of a perfect fit, and says why', () => {
    const rows: PanelRow[] = ['A', 'B', 'C'].flatMap((company, index) =>
      Array.from({ length: 8 }, (_, year) => {
        const regressors = [((year * 7 + index * 3) % 11) + 1, ((year * 5 + index) % 7) + 1];
        return {
          company,
          year: 2000 + year,
          regressors,
          outcome: 10 * index + 2 * regressors[0] - regressors[1],
        };
      }),
    );
    const summary = summaryOf(panelOf(rows, names));
    expect(summary.inHolm).toBe(0);
    for (const result of summary.list) {
      expect(result).toEqual(
        jasmine.objectContaining({
          statistic: null,
          pValue: null,
          holm: 'none',
          reason: perfectFitReason,
        }),
      );
    }
  });

  it('gives a finite figure or a reason for every test, with two rows a company and with one regressor', () => {
    const short = (rows: readonly PanelRow[], count: number): PanelRow[] =>
      rows.filter(
        (row) =>
          rows.filter(({ company, year }) => company === row.company && year <= row.year).length <=
          count,
      );
    fc.assert(
      fc.property(
        panels,
        fc.integer({ min: 2, max: 9 }),
        fc.constantFrom('company' as const, 'company,year' as const),
        fc.constantFrom(1, 2),
        (rows, count, effects, regressors) => {
          const kept = short(rows, count);
          const years = new Set(kept.map(({ year }) => year)).size;
          const companies = new Set(kept.map(({ company }) => company)).size;
          fc.pre(
            kept.length - companies - regressors - (effects === 'company' ? 0 : years - 1) > 0,
          );
          const data = panelOf(
            kept.map((row) => ({ ...row, regressors: row.regressors.slice(0, regressors) })),
            { ...names, regressors: names.regressors.slice(0, regressors) },
          );
          for (const result of summaryOf(data, { effects }).list) {
            if (result.statistic === null) expect(result.reason).toMatch(/\.$/u);
            else expect(Number.isFinite(result.statistic)).withContext(result.code).toBeTrue();
            if (result.pValue === null) expect(result.reason).toMatch(/\.$/u);
            else {
              expect(result.pValue).withContext(result.code).toBeGreaterThanOrEqual(0);
              expect(result.pValue).withContext(result.code).toBeLessThanOrEqual(1);
            }
          }
        },
      ),
      { numRuns: 60 },
    );
  });

  it('moves no statistic when units change or a level is added', () => {
    fc.assert(
      fc.property(
        panels,
        fc.constantFrom('company' as const, 'company,year' as const),
        (rows, effects) => {
          const plain = summaryOf(panelOf(rows, names), { effects });
          const changed = summaryOf(
            panelOf(
              rows.map((row) => ({
                ...row,
                outcome: 1000 * row.outcome + 1e6,
                regressors: [row.regressors[0] / 8 - 1e4, row.regressors[1]],
              })),
              names,
            ),
            { effects },
          );
          plain.list.forEach(({ code, statistic }, index) => {
            const other = changed.list[index].statistic;
            if (statistic === null) expect(other).toBeNull();
            else expectDigits(other, statistic, 6, code);
          });
        },
      ),
      { numRuns: 40 },
    );
  });

  it('does not compare every pair of very many companies, and runs the rest', () => {
    const rows: PanelRow[] = [];
    for (let company = 0; company < 501; company += 1) {
      for (let year = 0; year < 4; year += 1) {
        const regressors = [(company * 13 + year * 29 + ((year * company) % 5)) % 37];
        const noise = ((company * 17 + year * 31 + year * year * company) % 23) - 11;
        rows.push({
          company: `K${company}`,
          year: 2000 + year,
          regressors,
          outcome: company + regressors[0] + noise,
        });
      }
    }
    const { list } = summaryOf(panelOf(rows, { outcome: 'y', regressors: ['x'] }));
    expect(list.find(({ code }) => code === 'pesaran-cd')?.reason).toContain('found 501');
    expect(list.find(({ code }) => code === 'brown-forsythe')?.statistic).toBeGreaterThan(0);
  });
});
