import type { PanelColumn } from '@contract';
import type { PanelRow } from '../panel-rows';
import { type ShownGrid, copiedText } from './copy-cells';
import { findCells } from './find-cells';
import { pastedCells, typedFigure } from './paste-cells';

const columns: readonly PanelColumn[] = [
  { name: 'mv', role: 'marketValue' },
  { name: 'capex', role: 'capex' },
  { name: 'staff', role: 'other' },
];
const rows: readonly PanelRow[] = [
  { fileRow: 2, company: 'Kesdrin', year: 2020, values: [1100.123456789, 1.1, 40] },
  { fileRow: 3, company: 'Kesdrin', year: 2021, values: [-11, null, 41] },
  { fileRow: 0, company: 'Velmara', year: 2020, values: [20, 3, 42] },
];
const grid = (factor = 1): ShownGrid => ({
  rowCount: rows.length,
  rowAt: (row) => rows[row],
  columns,
  factor,
});
const range = (firstRow: number, lastRow: number, firstColumn: number, lastColumn: number) => ({
  ...{ firstRow, lastRow },
  ...{ firstColumn, lastColumn },
});

describe('copying cells', () => {
  it('takes every digit, nothing for a missing cell, and the company and year as they are', () => {
    expect(copiedText(range(0, 2, 0, 5), grid())).toBe(
      'Kesdrin\t2020\t1100.123456789\t1.1\t40\t2\nKesdrin\t2021\t-11\t\t41\t3\nVelmara\t2020\t20\t3\t42\t',
    );
  });

  it('takes money in the unit that is shown, and leaves other columns alone', () => {
    expect(copiedText(range(0, 0, 2, 4), grid(1000))).toBe('1100123.456789\t1100\t40');
  });
});

describe('pasting cells', () => {
  it('lands with the first cell at the first of the range, in the unit that is shown', () => {
    const outcome = pastedCells('2,500.5\t(3)\n\t7', range(1, 1, 2, 2), grid(1000));
    expect(outcome.kind === 'fits' && outcome.range).toEqual(range(1, 2, 2, 3));
    expect(outcome.kind === 'fits' ? outcome.changes : []).toEqual([
      { place: { company: 'Kesdrin', year: 2021, column: 0 }, value: 2.5005 },
      { place: { company: 'Kesdrin', year: 2021, column: 1 }, value: -0.003 },
      { place: { company: 'Velmara', year: 2020, column: 0 }, value: null },
      { place: { company: 'Velmara', year: 2020, column: 1 }, value: 0.007 },
    ]);
  });

  it('fills the range with a single cell', () => {
    const outcome = pastedCells('5', range(0, 2, 2, 3), grid());
    expect(outcome.kind === 'fits' && outcome.changes.map(({ value }) => value)).toEqual([
      ...[5, 5, 5],
      ...[5, 5, 5],
    ]);
  });

  it('changes no bit of what was copied from the same cells, whatever the unit', () => {
    for (const factor of [1e-6, 1e-3, 1, 1e3, 1e6]) {
      const whole = range(0, 2, 2, 4);
      const outcome = pastedCells(copiedText(whole, grid(factor)), whole, grid(factor));
      const values = outcome.kind === 'fits' ? outcome.changes.map(({ value }) => value) : [];
      expect(values).toEqual(rows.flatMap((row) => row.values));
    }
  });

  it('refuses a block that does not fit, and says where', () => {
    const outcome = pastedCells('1\t2\t3\n4\t5\t6', range(2, 2, 3, 3), grid());
    expect(outcome.kind === 'refused' && outcome.problem.places).toEqual([
      '1 row would be below the last row.',
      '1 column would be to the right of staff, the last figure.',
    ]);
    const names = pastedCells('1', range(0, 0, 0, 2), grid());
    expect(names.kind === 'refused' && names.problem.places?.[0]).toContain('company or year');
  });

  it('refuses the whole block for one text that is no number, and names the cell', () => {
    const outcome = pastedCells('1\t2\n3\tabout 4', range(0, 0, 2, 2), grid());
    expect(outcome.kind === 'refused' && outcome.problem).toEqual({
      title: 'Nothing is pasted: 1 cell of the block is no number of its column',
      places: ['Kesdrin 2021, Capex: found “about 4”'],
    });
  });

  it('refuses a share in per cent where money stands, typed or pasted, and takes it elsewhere', () => {
    const outcome = pastedCells('1\t12%\t12%', range(0, 0, 2, 2), grid());
    expect(outcome.kind === 'refused' && outcome.problem.places).toEqual([
      'Kesdrin 2020, Capex: found “12%”, a share in per cent is no amount of money',
    ]);
    expect(typedFigure('12%', rows[0], 1, grid())).toEqual({
      problem: {
        title: 'Not taken: a share in per cent is no amount of money',
        places: ['Kesdrin 2020, Capex: found “12%”'],
      },
    });
    const place = { company: 'Kesdrin', year: 2020, column: 2 };
    expect(typedFigure('12%', rows[0], 2, grid())).toEqual({ place, value: 0.12 });
  });
});

describe('finding cells', () => {
  const find = (text: string, factor = 1) => findCells(text, grid(factor), [1, 1, 0]);

  it('looks at companies, years and values', () => {
    expect(find('kesd')).toEqual([
      { row: 0, column: 0 },
      { row: 1, column: 0 },
    ]);
    expect(find('2021')).toEqual([{ row: 1, column: 1 }]);
    expect(find('41')).toEqual([{ row: 1, column: 4 }]);
    expect(find('  ')).toEqual([]);
  });

  it('finds a value by what is shown of it and by its further digits', () => {
    expect(find('1,100.1')).toEqual([{ row: 0, column: 2 }]);
    expect(find('456789')).toEqual([{ row: 0, column: 2 }]);
    expect(find('(11)')).toEqual([{ row: 1, column: 2 }]);
    expect(find('1,100,123', 1000)).toEqual([{ row: 0, column: 2 }]);
  });
});
