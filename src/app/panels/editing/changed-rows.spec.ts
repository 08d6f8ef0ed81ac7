import type { PanelRow } from '../panel-rows';
import { changedRows } from './changed-rows';

const rows: readonly PanelRow[] = [
  { fileRow: 2, company: 'Kesdrin', year: 2020, values: [10] },
  { fileRow: 3, company: 'Kesdrin', year: 2021, values: [11] },
];

describe('rows that changed', () => {
  it('are those with other figures', () => {
    const now = [rows[0], { ...rows[1], values: [12] }];
    expect(changedRows(rows, now)).toEqual([now[1]]);
    expect(changedRows(rows, [...rows])).toEqual([]);
    expect(changedRows(rows, structuredClone(rows))).toEqual([]);
  });

  it('cannot be told where there are other rows, or in another order', () => {
    expect(changedRows(rows, [rows[0]])).toBeNull();
    expect(changedRows(rows, [rows[1], rows[0]])).toBeNull();
    expect(changedRows(rows, [rows[0], { ...rows[1], fileRow: 4 }])).toBeNull();
  });
});
