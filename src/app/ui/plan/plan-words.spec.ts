import { TestBed } from '@angular/core/testing';
import { familiarRange } from '@prediction';
import { NumberFormat } from '../number-format';
import {
  decidingYear,
  expectedName,
  familiarFinding,
  familiarReason,
  planAssumptions,
  planFinding,
} from './plan-words';
import { regressorLabels } from './regressor-labels';
import { lagBasis, logBasis, planBasis } from './testing/plan-basis';
import { listed } from '../phrases';

describe('a plan in words', () => {
  let numbers: NumberFormat;
  const labels = ['capex', 'book equity'];
  const finding = (estimate: number, low: number | null, high: number | null) =>
    planFinding(
      'Build-out',
      planBasis,
      { year: 2028, difference: { estimate, standardError: 1, low, high } },
      numbers,
    );

  beforeEach(() => {
    numbers = TestBed.inject(NumberFormat);
    numbers.panelUnit.set('millions');
    numbers.unit.set('millions');
  });

  it('says that it lifts or lowers the expected value, with the interval the right way round', () => {
    expect(finding(285, 100, 470)).toBe(
      'Build-out lifts the expected value of Velmara by 285 (100 to 470) by FY2028',
    );
    expect(finding(-285, -470, -100)).toBe(
      'Build-out lowers the expected value of Velmara by 285 (100 to 470) by FY2028',
    );
  });

  it('says may where the interval holds zero or is missing', () => {
    expect(finding(285, -100, 670)).toContain('may lift');
    expect(finding(-285, null, null)).toContain('may lower');
    expect(finding(0, 0, 0)).toBe(
      'Build-out leaves the expected value of Velmara where the base has it in FY2028',
    );
  });

  it('says the difference of a fit in logs in percent', () => {
    const difference = {
      estimate: Math.log(0.9),
      standardError: 0.03,
      low: Math.log(0.85),
      high: Math.log(0.95),
    };
    expect(planFinding('Build-out', logBasis, { year: 2028, difference }, numbers)).toBe(
      'Build-out lowers the expected value of Velmara by 10.0 % (5.0 to 15.0 %) by FY2028',
    );
  });

  it('says what a plan takes for granted, and nothing of a plain fit', () => {
    const yearEffects = { ownMean: 0, last: 5, lastYear: 2025, lastThree: 2, ownLast: 5 };
    expect(planAssumptions(planBasis, 3)).toEqual([]);
    expect(planAssumptions({ ...lagBasis, yearEffects }, 3)).toEqual([
      'This fit reads regressors of the year before: this year’s plan acts next year. FY2026 reads FY2025 as it was; the plan of FY2028 acts in FY2029, which is not shown.',
      'Year effect of every planned year: that of FY2025, the last observed.',
    ]);
    expect(planAssumptions(logBasis, 1)).toEqual([
      'This fit reads logs: expected values are means, brought back to amounts; differences are percentages. Every amount has to be above zero.',
    ]);
    expect([expectedName('log'), expectedName(undefined)]).toEqual([
      'Expected value, mean',
      'Expected value',
    ]);
  });

  it('judges a plan by the last year that differs from the base', () => {
    const year = (number: number, estimate: number) => ({
      year: number,
      difference: { estimate, standardError: 1, low: null, high: null },
    });
    expect(decidingYear([year(2026, 5), year(2027, 9), year(2028, 0)])?.year).toBe(2027);
    expect(decidingYear([year(2026, 0), year(2027, 0)])?.year).toBe(2027);
    const none: ReturnType<typeof year>[] = [];
    expect(decidingYear(none)).toBeUndefined();
  });

  it('says which amount left whose range', () => {
    const far = familiarRange(planBasis, [190, 1000]);
    expect(far.kind).toBe('edge');
    expect(familiarFinding([2027, 2028], far.kind)).toBe(
      'FY2027 and FY2028 are at the edge of the familiar range',
    );
    expect(familiarReason(planBasis, labels, far, numbers)).toContain(
      'Capex 190.0 is above Velmara’s own range (60.0 to 150.0) and within its peers’ (20.0 to 300.0).',
    );
  });

  it('says so when each amount alone was seen and only together they were not', () => {
    const together = familiarRange({ ...planBasis, largestOwnLeverage: 0.1 }, [140, 1200]);
    expect(together.kind).toBe('edge');
    expect(familiarReason(planBasis, labels, together, numbers)).toContain(
      'Each value alone has been seen; capex and book equity together have not.',
    );
  });

  it('names regressors by their role, and by their header where they have none', () => {
    expect(regressorLabels(['inv', 'capital', 'research'])).toEqual([
      'capex',
      'book equity',
      'research',
    ]);
    expect(regressorLabels(['equity', 'inv'], ['bookEquity', 'capex'])).toEqual([
      'book equity',
      'capex',
    ]);
    expect(listed(['a', 'b', 'c'])).toBe('a, b and c');
    expect(listed(['a'])).toBe('a');
  });
});
