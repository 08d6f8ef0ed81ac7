import { TestBed } from '@angular/core/testing';
import { NumberFormat } from '../../ui/number-format';
import type { PanelRow } from '../panel-rows';
import type { ShownGrid } from './copy-cells';
import { fileCells, selectedTable } from './selected-table';

const rows: readonly PanelRow[] = [
  { fileRow: 2, company: 'Kesdrin', year: 2020, values: [1100.123456789, 1.1, 40] },
  { fileRow: 0, company: '=Velmara', year: 2021, values: [-11, null, 41] },
];
const grid: ShownGrid = {
  rowCount: rows.length,
  rowAt: (row) => rows[row],
  columns: [
    { name: 'mv', role: 'marketValue' },
    { name: 'inv', role: 'capex' },
    { name: 'staff', role: 'other' },
  ],
  factor: 1000,
};
const block = (firstColumn: number, lastColumn: number) => ({
  range: { firstRow: 0, lastRow: 1, firstColumn, lastColumn },
  grid,
});

describe('the selected cells as a table', () => {
  let numbers: NumberFormat;
  beforeEach(() => {
    numbers = TestBed.inject(NumberFormat);
    numbers.currency.set('EUR');
    numbers.panelUnit.set('millions');
    numbers.unit.set('thousands');
  });

  it('have company and year in each row, units in the headers and every digit', () => {
    const { columns, rows: lines } = selectedTable(block(3, 4), numbers);
    expect(columns.map(({ header }) => header)).toEqual([
      'Company',
      'Year',
      'Capex, EUR k',
      'staff',
    ]);
    expect(lines).toEqual([
      ['Kesdrin', 2020, 1100, 40],
      ['=Velmara', 2021, null, 41],
    ]);
    expect(selectedTable(block(2, 2), numbers).rows[0][2]).toBe(1100123.456789);
  });

  it('have company and year once where these are selected, and the line of the file where that is', () => {
    expect(selectedTable(block(0, 5), numbers).columns.map(({ header }) => header)).toEqual([
      ...['Company', 'Year', 'Market value, EUR k', 'Capex, EUR k', 'staff', 'Line of file'],
    ]);
    expect(selectedTable(block(0, 5), numbers).rows.map((row) => row[5])).toEqual([2, null]);
    expect(selectedTable(block(0, 0), numbers).rows[0]).toEqual(['Kesdrin', 2020]);
  });

  it('count as many cells as their file has', () => {
    for (const each of [block(0, 0), block(3, 4), block(0, 5), block(5, 5)]) {
      const table = selectedTable(each, numbers);
      expect(fileCells(each)).toBe(table.rows.length * table.columns.length);
    }
  });
});
