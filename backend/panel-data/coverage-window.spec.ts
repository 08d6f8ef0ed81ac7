import { largestWindow } from './coverage-window';
import type { PanelCells } from './panel-cells';
import { goldenPanel, goldenPanelData, panelOf } from './testing/golden-panel';

const model = [0, 1, 2];

describe('the largest fully covered window', () => {
  const cases = [
    ['balanced', 'grunfeld10', null],
    ['unbalanced', 'grunfeld10_unbalanced', null],
    ['unbalancedWithF07', 'grunfeld10_unbalanced', 'F07'],
    ['unbalancedWithF02', 'grunfeld10_unbalanced', 'F02'],
  ] as const;
  for (const [block, file, own] of cases) {
    it(`is the one that trying every window finds: ${block}`, () => {
      const golden = goldenPanelData.windows[block];
      const rows = golden.companies.length * (golden.lastYear - golden.firstYear + 1);
      expect(largestWindow(goldenPanel(file), model, own)).toEqual({ ...golden, rows });
    });
  }

  it('leaves the own company out only where no window has it', () => {
    // F10 of the unbalanced panel has three years.
    const found = largestWindow(goldenPanel('grunfeld10_unbalanced'), model, 'F10');
    expect(found).toEqual(largestWindow(goldenPanel('grunfeld10_unbalanced'), model));
  });

  it('stops at a missing cell of a column that counts', () => {
    const years = Array.from({ length: 12 }, (_, place) => 2000 + place);
    const panel = panelOf(
      ['Aldren', 'Brovik'].flatMap((name) =>
        years.map((year): [string, number, number, number, number] => [
          name,
          year,
          1,
          name === 'Aldren' && year === 2004 ? NaN : 1,
          1,
        ]),
      ),
    );
    expect(largestWindow(panel, model)).toEqual({
      firstYear: 2005,
      lastYear: 2011,
      companies: ['Aldren', 'Brovik'],
      rows: 14,
    });
    expect(largestWindow(panel, [0, 2])?.firstYear).toBe(2000);
  });

  it('is none for an empty panel and for five years', () => {
    const empty: PanelCells = { ...panelOf([]), values: [[], [], []] };
    expect(largestWindow(empty, model)).toBeNull();
    const short = goldenPanel('grunfeld10');
    const kept = [...Array(short.year.length).keys()].filter((row) => short.year[row] < 1940);
    const cut = panelOf(
      kept.map((row) => [
        short.companies[short.company[row]],
        short.year[row],
        short.values[0][row],
        short.values[1][row],
        short.values[2][row],
      ]),
    );
    expect(largestWindow(cut, model)).toBeNull();
  });
});
