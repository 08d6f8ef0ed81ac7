import { addRow, noEdits, savedRows } from './editing/panel-edits';
import type { PanelRow } from './panel-rows';
import { rowsWithin } from './rows-within';

const rows: readonly PanelRow[] = ['Kesdrin', 'Sarvane'].flatMap((company) =>
  [2019, 2020, 2021].map((year) => ({ fileRow: 2, company, year, values: [1, null] })),
);
const window = { firstYear: 2020, lastYear: 2021, companies: ['Kesdrin'], rows: 2 };

describe('the rows of a window', () => {
  const shown = (
    only: typeof window | null,
    keep: Partial<Parameters<typeof rowsWithin>[2]> = {},
  ) =>
    rowsWithin(rows, only, { edits: noEdits, asked: null, ...keep }).map(
      ({ company, year }) => `${company} ${year}`,
    );

  it('are those of its companies in its years; all where there is none', () => {
    expect(shown(window)).toEqual(['Kesdrin 2020', 'Kesdrin 2021']);
    expect(rowsWithin(rows, null, { edits: noEdits, asked: null })).toBe(rows);
  });

  it('are joined by the row that is asked for, and by one that was edited', () => {
    const asked = { company: 'Sarvane', year: 2021 };
    expect(shown(window, { asked })).toContain('Sarvane 2021');
    const edits = addRow(noEdits, savedRows(rows.slice(1)), { company: 'Kesdrin', year: 2019 });
    expect(shown(window, { edits })).toEqual(['Kesdrin 2019', 'Kesdrin 2020', 'Kesdrin 2021']);
  });
});
