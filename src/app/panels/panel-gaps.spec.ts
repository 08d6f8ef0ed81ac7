import { rowsWithGaps, shorterCompanies } from './panel-gaps';
import type { PanelRow } from './panel-rows';

function row(company: string, year: number, values: readonly (number | null)[] = [1]): PanelRow {
  return { fileRow: year - 2000, company, year, values };
}

describe('gaps of a panel', () => {
  it('names row and column of every missing cell', () => {
    const rows = [row('A', 2008, [1, null]), row('A', 2009, [0, 1]), row('B', 2008, [null, null])];
    expect(rowsWithGaps(rows, ['Market value', 'Capex'])).toEqual([
      { company: 'A', year: 2008, fileRow: 8, missing: ['Capex'] },
      { company: 'B', year: 2008, fileRow: 8, missing: ['Market value', 'Capex'] },
    ]);
  });

  it('names a late entry, an early exit and a skipped year, and nobody who is there throughout', () => {
    const rows = [
      ...[2008, 2009, 2010, 2011].map((year) => row('Whole', year)),
      row('Late', 2010),
      row('Late', 2011),
      row('Early', 2008),
      row('Skips', 2008),
      row('Skips', 2011),
    ];
    expect(shorterCompanies(rows)).toEqual([
      { company: 'Late', firstYear: 2010, lastYear: 2011, yearsWithoutRow: [] },
      { company: 'Early', firstYear: 2008, lastYear: 2008, yearsWithoutRow: [] },
      { company: 'Skips', firstYear: 2008, lastYear: 2011, yearsWithoutRow: [2009, 2010] },
    ]);
  });

  it('finds nothing in an empty panel', () => {
    expect(rowsWithGaps([], ['Capex'])).toEqual([]);
    expect(shorterCompanies([])).toEqual([]);
  });
});
