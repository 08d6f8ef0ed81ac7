import { checkFile } from './check-file';
import { filePanel } from './file-panel';
import type { FileRecipe } from './file-recipe';
import type { FileCheck } from './parse-messages';
import type { Table } from './parsing/table';
import { plainHeader, plainRecipe, tableOf } from './testing/tables';

function check(table: Table, recipe: Partial<FileRecipe> = {}): FileCheck {
  return checkFile({ table, formulaCells: 0 }, { ...plainRecipe, ...recipe }, null);
}

describe('the check of figures with a currency at them', () => {
  const table = tableOf(
    plainHeader,
    ['A', '2020', '€1', '$136.692', '3 EUR'],
    ['A', '2021', '1', '2 USD', '3'],
    ['A', '2022', '1', '2', '12%'],
  );

  it('finds what is not the panel’s, keeps the file out and takes nothing for it', () => {
    const { findings, blockingCount } = check(table);
    const blocking = findings.filter(({ isBlocking }) => isBlocking);
    expect(blocking.map(({ row, column, found, code }) => [row, column, found, code])).toEqual([
      [2, 'capex', '$136.692', 'other-currency'],
      [3, 'capex', '2 USD', 'other-currency'],
      [4, 'be', '12%', 'not-a-number'],
    ]);
    expect(blocking[0].detail).toContain('Found $ in a column of EUR: say what it is.');
    expect(blocking[2].detail).toContain('per cent');
    expect(blockingCount).toBe(3);
    expect([...filePanel(table, plainRecipe).values[1]]).toEqual([NaN, NaN, 2]);
  });

  it('lets a sign pass that may be the panel’s', () => {
    const dollars = tableOf(plainHeader, ['A', '2020', '$1', 'AUD 2', 'A$3']);
    expect(check(dollars, { currency: 'AUD' }).findings).toEqual([]);
    expect(check(dollars, { currency: 'CAD' }).findings.map(({ found }) => found)).toEqual([
      'AUD 2',
      'A$3',
    ]);
  });

  it('goes by the row’s currency where rows have one', () => {
    const rows = tableOf(
      [...plainHeader, 'cur'],
      ['A', '2020', '$1', '2', '3', 'USD'],
      ['B', '2020', '€1', '2', '3', 'USD'],
      ['C', '2020', '€1', '2', '3', 'EUR'],
    );
    const rates = [{ currency: 'USD', year: 2020, average: 0.5, yearEnd: 0.5 }];
    const conversion = { ...plainRecipe.conversion, currencies: { column: 'cur', rates } };
    const { findings } = check(rows, { conversion });
    expect(findings.map(({ row, found }) => [row, found])).toEqual([[3, '€1']]);
    expect(findings[0].detail).toContain('Found € in a row of USD');
  });

  it('takes a share for one in a column that is no money', () => {
    const growth = tableOf([...plainHeader, 'growth'], ['A', '2020', '1', '2', '3', '12%']);
    expect(check(growth, { others: ['growth'] }).findings).toEqual([]);
  });

  it('takes a figure that was mended', () => {
    const cells = [
      { row: 2, column: 'capex', text: '120' },
      { row: 3, column: 'capex', text: '€2' },
      { row: 4, column: 'be', text: '3' },
    ];
    expect(check(table, { mending: { ...plainRecipe.mending, cells } }).findings).toEqual([]);
  });
});

describe('the check of lines that may be sums', () => {
  it('asks whether they are companies, and keeps nothing out', () => {
    const figures = ['1', '2', '3'];
    const result = check(
      tableOf(
        plainHeader,
        ['A', '2024', ...figures],
        ['Total', '2024', ...figures],
        ["Peers' mean:", '2024', ...figures],
        ['Durchschnitt', '2024', ...figures],
        ['Total Pumpen AG', '2024', ...figures],
        ['Summer', '2024', ...figures],
      ),
    );
    const sums = result.findings.filter(({ code }) => code === 'sum');
    expect(sums.map(({ row, column }) => [row, column])).toEqual([
      [3, 'company'],
      [4, 'company'],
      [5, 'company'],
    ]);
    expect(sums[0].detail).toContain('A company, or a sum of others?');
    expect(result.blockingCount).toBe(0);
    expect(result.rows).toBe(6);
  });
});
