import { cautions } from '@contract';
import { chartTable } from './chart-table';

const text = { title: 'Velmara stands above', caption: 'EUR m', source: 'Panel v4' };
const columns = [
  { label: 'company', isNumber: false },
  { label: 'interval', isNumber: true, headers: ['low, EUR m', 'high, EUR m'] },
];

describe('the table of a chart for a file', () => {
  it('has the exact values under the headers of the file', () => {
    const rows = [{ cells: ['Velmara', '0.1 to 0.3'], values: ['Velmara', 0.123456789, null] }];
    const table = chartTable(text, columns, rows);
    expect(table.columns.map(({ header }) => header)).toEqual([
      'company',
      'low, EUR m',
      'high, EUR m',
    ]);
    expect(table.rows).toEqual([['Velmara', 0.123456789, null]]);
  });

  it('has what is written where a chart has no more', () => {
    const rows = [{ cells: ['Velmara', '0.1 to 0.3'] }];
    const table = chartTable(text, columns, rows);
    expect(table.columns.map(({ header }) => header)).toEqual(['company', 'interval']);
    expect(table.rows).toEqual([['Velmara', '0.1 to 0.3']]);
  });

  it('says what it is, where it comes from, and what to be careful with', () => {
    const { name, notes } = chartTable({ ...text, caption: '' }, columns, [], 'Two left out.');
    expect(name).toBe(text.title);
    expect(notes.map(({ label, text }) => `${label}: ${text}`)).toEqual([
      'Note: Two left out.',
      'Source: Panel v4',
      ...cautions.map((caution) => `Caution: ${caution}`),
    ]);
  });
});
