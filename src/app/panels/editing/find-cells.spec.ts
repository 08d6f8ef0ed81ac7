import type { PanelColumn } from '@contract';
import type { PanelRow } from '../panel-rows';
import { findCells } from './find-cells';

const columns: readonly PanelColumn[] = [{ name: 'inv', role: 'capex' }];
const rows: readonly PanelRow[] = [
  { fileRow: 2, company: 'Arvo', year: 2020, values: [1234.5] },
  { fileRow: 3, company: 'Arvo', year: 2021, values: [11] },
  { fileRow: 4, company: 'Kesdrin 2021 Holding', year: 2020, values: [null] },
  { fileRow: 5, company: 'Velmara Arvo', year: 2021, values: [20] },
];

function found(text: string): readonly string[] {
  const grid = { rowCount: rows.length, rowAt: (row: number) => rows[row], columns, factor: 1 };
  return findCells(text, grid, [1]).map(({ row, column }) => `${row}:${column}`);
}

describe('finding cells', () => {
  it('takes a company and a year together, in either order and while it is typed', () => {
    expect(found('arvo 2021')).toEqual(['1:0', '3:0']);
    expect(found(' 2021  Velmara arvo ')).toEqual(['3:0']);
    expect(found('arvo FY2020')).toEqual(['0:0']);
    expect(found('arvo 20')).toEqual(['0:0', '1:0', '3:0']);
    expect(found('kesdrin 2021')).toEqual(['2:0']);
    expect(found('arvo 2019')).toEqual([]);
  });

  it('takes a part of a company, a year or a value alone', () => {
    expect(found('velm')).toEqual(['3:0']);
    expect(found('2021')).toEqual(['1:1', '2:0', '3:1']);
    expect(found('1 234.5')).toEqual(['0:2']);
    expect(found('')).toEqual([]);
  });
});
