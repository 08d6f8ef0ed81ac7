import type { PanelColumn } from '@contract';
import { firstValueFrom } from 'rxjs';
import type { PanelRow } from '../panel-rows';
import { dismissalOf, sortedFlags } from './dismissed-flags';
import { findInPanel } from './flag-finder';
import { leftOut } from './left-out';
import { modelColumns, panelCells } from './panel-cells';
import { dismissalOfJump, jump, missing } from './testing/example-flags';

const columns: PanelColumn[] = [
  { name: 'mv', role: 'marketValue' },
  { name: 'staff', role: 'other' },
  { name: 'capex', role: 'capex' },
  { name: 'equity', role: 'bookEquity' },
];

function panel(companies: number, years: number): PanelRow[] {
  return Array.from({ length: companies * years }, (_, place) => {
    const [company, step] = [Math.floor(place / years), place % years];
    const size = 100 * (company + 1) * 1.05 ** step;
    return {
      fileRow: place + 2,
      company: `Company ${company}`,
      year: 2000 + step,
      values: [size, 5, size / 10, size / 2],
    };
  });
}

describe('what the rules find', () => {
  it('is found in the rows as they stand, missing cells as such', async () => {
    const rows = panel(3, 8).map((row) =>
      row.company === 'Company 1' && row.year === 2003
        ? { ...row, values: [row.values[0], null, null, row.values[3]] }
        : row,
    );
    const cells = panelCells(rows, columns);
    const found = await firstValueFrom(
      findInPanel({ cells, columns: modelColumns(columns), ownCompany: 'Company 0' }),
    );
    expect(found.flags.map(({ year, column, facts }) => [year, column, facts.code])).toEqual([
      [2003, 1, 'missing'],
      [2003, 2, 'missing'],
    ]);
    expect(found.window).toEqual({
      firstYear: 2000,
      lastYear: 2007,
      companies: ['Company 0', 'Company 2'],
      rows: 16,
    });
  });

  it('is found beside the page in a large panel', async () => {
    const rows = panel(150, 20);
    rows[45] = { ...rows[45], values: [4e5, 5, 40, 200] };
    const cells = panelCells(rows, columns);
    const question = { cells, columns: modelColumns(columns), ownCompany: null };
    const { flags } = await firstValueFrom(findInPanel(question));
    expect(flags.find(({ column }) => column === 0)?.facts.code).toBe('unit-slip');
  });

  it('says what a company lacks that is not in the window', () => {
    const rows = panel(3, 8)
      .filter(({ company, year }) => company !== 'Company 2' || ![2000, 2001, 2005].includes(year))
      .map((row) =>
        row.company !== 'Company 0' && row.year === 2003
          ? { ...row, values: [1, null, null, 1] }
          : row,
      );
    const window = { firstYear: 2000, lastYear: 2007, companies: ['Company 0'], rows: 8 };
    expect(leftOut(window, rows, modelColumns(columns))).toEqual([
      { company: 'Company 1', why: 'a figure missing in FY2003' },
      {
        company: 'Company 2',
        why: 'no row in FY2000–FY2001 and FY2005 and a figure missing in FY2003',
      },
    ]);
  });

  it('is put aside where somebody found it right, as long as the value stays', () => {
    const kept = sortedFlags([jump, missing], [dismissalOfJump]);
    expect(kept.open).toEqual([missing]);
    expect(kept.dismissed).toEqual([{ flag: jump, dismissal: dismissalOfJump }]);
    expect(sortedFlags([{ ...jump, value: 4121 }], [dismissalOfJump]).open.length).toBe(1);
    expect(dismissalOf(jump, 'New plant')).toEqual({
      company: 'Kesdrin',
      year: 2016,
      column: 1,
      code: 'jump',
      value: 4120,
      reason: 'New plant',
    });
  });
});
