import { checkFile } from './check-file';
import { filePanel } from './file-panel';
import type { FileMending, FileRecipe } from './file-recipe';
import { readFile } from './parsing/read-file';
import { plainRecipe } from './testing/tables';

const text = [
  'Firm,Value 2020,Value 2021,Capex 2020,Capex 2021,Equity 2020,Equity 2021',
  'Nordwerk,100,n.m.,10,11,50,51',
  'Tallow,200,210,20,21,60,61',
].join('\n');

const wide: FileRecipe = {
  ...plainRecipe,
  company: 'Firm',
  year: 'Year',
  marketValue: 'Value',
  capex: 'Capex',
  bookEquity: 'Equity',
  reading: { ...plainRecipe.reading, layout: { kind: 'years-in-columns', item: null } },
};

describe('a file with its years in columns', () => {
  it('has its findings where they stand in the file, and is mended there', async () => {
    const file = await readFile(Buffer.from(text), 'wide.csv', wide.reading);
    const { findings, reviewRows, rows } = checkFile(file, wide, null);
    expect(rows).toBe(4);
    expect(findings.map(({ row, column, found, code }) => [row, column, found, code])).toEqual([
      [2, 'Value 2021', 'n.m.', 'not-a-number'],
    ]);
    expect(reviewRows.map(({ row, isTaken }) => [row, isTaken])).toEqual([
      [2, true],
      [2, true],
    ]);

    const mending: FileMending = {
      cells: findings.map(({ row, column }) => ({ row, column, text: '110' })),
      excludedRows: [3],
      renames: [{ from: 'Nordwerk', to: 'Nordwerk AG' }],
    };
    const mended = { ...wide, mending };
    expect(checkFile(file, mended, null).findingCount).toBe(0);
    expect(filePanel(file.table, mended)).toEqual(
      jasmine.objectContaining({
        companies: ['Nordwerk AG'],
        year: Int32Array.of(2020, 2021),
        values: [Float64Array.of(100, 110), Float64Array.of(10, 11), Float64Array.of(50, 51)],
        fileRow: Int32Array.of(2, 2),
      }),
    );
  });
});
