import type { Flag } from '@panel-data';
import type { PanelRow } from '../panel-rows';
import { addRow, cellKey, editedRows, noEdits, savedRows, setCells } from './panel-edits';
import { type RowFilter, filteredRows, flagCounts, flagsAt } from './row-filter';

const rows: readonly PanelRow[] = [
  { fileRow: 2, company: 'Kesdrin', year: 2020, values: [10, null] },
  { fileRow: 3, company: 'Kesdrin', year: 2021, values: [-11, 5] },
  { fileRow: 4, company: 'Velmara', year: 2020, values: [20, 6] },
];
const saved = savedRows(rows);
const sign: Flag = {
  ...{ company: 'Kesdrin', year: 2021, column: 0, value: -11 },
  facts: { code: 'sign' },
};
const flags = new Map([[cellKey({ company: 'Kesdrin', year: 2021, column: 0 }), [sign]]]);

describe('the rows that are shown', () => {
  const shown = (filter: RowFilter, edits = noEdits) =>
    filteredRows(editedRows(rows, saved, 2, edits), filter, { edits, flags }).map(
      ({ company, year }) => `${company} ${year}`,
    );

  it('are those with a gap, with an edit, with a flag, or all', () => {
    const added = addRow(noEdits, saved, { company: 'Velmara', year: 2021 });
    expect(shown('all')).toEqual(['Kesdrin 2020', 'Kesdrin 2021', 'Velmara 2020']);
    expect(shown('gaps')).toEqual(['Kesdrin 2020']);
    expect(shown('sign')).toEqual(['Kesdrin 2021']);
    expect(shown('edited')).toEqual([]);
    expect(shown('edited', added)).toEqual(['Velmara 2021']);
  });

  it('keep the row whose gap is just being filled', () => {
    const filled = setCells(noEdits, saved, [
      { place: { company: 'Kesdrin', year: 2020, column: 1 }, value: 4 },
    ]);
    expect(shown('gaps', filled)).toEqual(['Kesdrin 2020']);
  });

  it('are counted by flag, and tell the flags of a cell', () => {
    expect([...flagCounts(flags)]).toEqual([['sign', 1]]);
    expect(flagsAt(flags, rows[1], 0)).toEqual([sign]);
    expect(flagsAt(flags, rows[1], undefined)).toEqual([]);
  });
});
