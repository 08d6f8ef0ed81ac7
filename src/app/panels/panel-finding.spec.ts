import { companiesAndYears, panelCompleteness, panelFinding } from './panel-finding';
import type { PanelRow } from './panel-rows';
import { counted } from '../ui/phrases';

const titles = ['Market value', 'Capex'];

function row(company: string, year: number, values: readonly (number | null)[]): PanelRow {
  return { fileRow: year, company, year, values };
}

describe('panelFinding', () => {
  it('says that nothing is missing', () => {
    const found = panelCompleteness([row('A', 2008, [1, 2]), row('B', 2009, [3, 4])], titles);
    expect(panelFinding(found, 0)).toBe('2 companies, FY2008–FY2009: no cell missing');
    expect(found.completeRows).toBe(2);
  });

  it('counts missing cells, not rows', () => {
    const found = panelCompleteness([row('A', 2008, [null, null]), row('A', 2009, [0, 1])], titles);
    expect(panelFinding(found, 0)).toBe('1 company, FY2008–FY2009: 2 cells missing');
    expect(found.completeRows).toBe(1);
  });

  it('counts a gap within a company’s years, but no late entry and no early exit', () => {
    const found = panelCompleteness(
      [
        row('A', 2008, [1, 1]),
        row('A', 2011, [1, 1]),
        row('Late', 2010, [1, 1]),
        row('Late', 2011, [1, 1]),
        row('Early', 2008, [1, 1]),
      ],
      titles,
    );
    expect(found.yearsWithoutRow).toBe(2);
    expect(panelFinding(found, 0)).toBe(
      '3 companies, FY2008–FY2011: 2 company years without a row',
    );
  });

  it('names both kinds of gap in one sentence', () => {
    const found = panelCompleteness([row('A', 2008, [null, 1]), row('A', 2010, [1, 1])], titles);
    expect(panelFinding(found, 0)).toBe(
      '1 company, FY2008–FY2010: 1 cell missing, 1 company year without a row',
    );
  });

  it('counts the figures that stand out', () => {
    const found = panelCompleteness([row('A', 2008, [1, 2])], titles);
    expect(panelFinding(found, 1)).toBe('1 company, FY2008: no cell missing, 1 figure to look at');
    expect(panelFinding(found, 3)).toContain('3 figures to look at');
  });

  it('counts by the thousand, in the singular, and one year as one', () => {
    expect(counted(1200, 'cell')).toBe('1,200 cells');
    expect(counted(1, 'company', 'companies')).toBe('1 company');
    expect(companiesAndYears({ companies: 1, firstYear: 2008, lastYear: 2008 })).toBe(
      '1 company, FY2008',
    );
  });
});
