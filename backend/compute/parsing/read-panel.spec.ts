import { plainHeader, tableOf } from '../testing/tables';
import type { TableMapping } from './column-indices';
import { FindingList } from './finding-list';
import { readPanel } from './read-panel';
import { plainTerms, type ReadingTerms } from './reading-terms';
import type { Table } from './table';
import { TableError } from './table-error';
import type { TableFinding } from './table-finding';

const mapping: TableMapping = { company: 'company', year: 'year', numbers: ['mv', 'capex'] };

function read(table: Table, terms: Partial<ReadingTerms> = {}, numbers = mapping.numbers) {
  const findings = new FindingList();
  const reading = readPanel(table, { ...mapping, numbers }, { ...plainTerms, ...terms }, findings);
  return { ...reading, findings: findings.first() };
}

function places(findings: readonly TableFinding[]): unknown[] {
  return findings.map(({ row, column, found, code }) => [row, column, found, code]);
}

describe('readPanel', () => {
  it('lists every place with what was found there, blocking ones first', () => {
    const reading = read(
      tableOf(
        plainHeader,
        ['A', '2020', '1', '2'],
        ['A', '2021', 'one', '2'],
        ['A', '2021', '3', 'NA'],
        ['', '2020', '1', '2'],
        ['B', '', '1', '2'],
        ['B', '20x0', '1', '2'],
      ),
    );
    expect(places(reading.findings)).toEqual([
      [3, 'mv', 'one', 'not-a-number'],
      [3, 'year', '2021', 'duplicate'],
      [4, 'year', '2021', 'duplicate'],
      [7, 'year', '20x0', 'year'],
      [4, 'capex', 'NA', 'missing'],
      [5, 'company', '', 'no-company'],
      [6, 'year', '', 'missing'],
    ]);
    expect(reading.companies).toEqual(['A']);
    expect([...reading.fileRow]).toEqual([2, 3, 4]);
  });

  it('lists text in a number also of rows that name no company or no year, but not their gaps', () => {
    const reading = read(
      tableOf(
        plainHeader,
        ['A', '2020', '1', '2'],
        ['', '2020', 'one', ''],
        ['B', '', '1', 'two'],
        ['B', '20x0', 'three', 'NA'],
        ['B', '2021', '3', '4'],
      ),
    );
    expect(places(reading.findings)).toEqual([
      [3, 'mv', 'one', 'not-a-number'],
      [4, 'capex', 'two', 'not-a-number'],
      [5, 'year', '20x0', 'year'],
      [5, 'mv', 'three', 'not-a-number'],
      [3, 'company', '', 'no-company'],
      [4, 'year', '', 'missing'],
    ]);
    expect([...reading.fileRow]).toEqual([2, 6]);
  });

  it('says how a column that could be read both ways was read, once', () => {
    const table = tableOf(plainHeader, ['A', '2020', '1.234', '1'], ['A', '2021', '5.678', '2']);
    const reading = read(table);
    expect(places(reading.findings)).toEqual([[2, 'mv', '1.234', 'ambiguous-number']]);
    expect(reading.findings[0].isBlocking).toBeFalse();
    expect(reading.findings[0].detail).toContain('decimal point this is 1.234.');
    expect([...reading.numbers[0].values]).toEqual([1.234, 5.678]);
  });

  it('reads by the decimal sign that is chosen, whatever the column looks like', () => {
    const table = tableOf(plainHeader, ['A', '2020', '1.234', '1,5'], ['A', '2021', '1.5', '2']);
    const reading = read(table, { decimalSign: ',' });
    expect([...reading.numbers[0].values]).toEqual([1234, NaN]);
    expect([...reading.numbers[1].values]).toEqual([1.5, 2]);
    expect(places(reading.findings)).toEqual([[3, 'mv', '1.5', 'not-a-number']]);
    expect(reading.findings[0].detail).toContain('as chosen for the file');
  });

  it('names the columns that are not there, and those of one name', () => {
    const table = { ...tableOf(plainHeader), repeatedHeaders: ['mv'] };
    const codeOf = (numbers: string[]): unknown => {
      try {
        return read(table, {}, numbers);
      } catch (error) {
        if (!(error instanceof TableError)) throw error;
        return [error.code, error.data.columns];
      }
    };
    expect(codeOf(['z'])).toEqual(['missing-column', ['z']]);
    expect(codeOf(['mv'])).toEqual(['ambiguous-column', ['mv']]);
    expect(codeOf(['capex', 'capex'])).toEqual(['ambiguous-column', ['capex']]);
  });

  it('names at most twenty other lines of a row that stands in many', () => {
    const rows = Array.from({ length: 40 }, () => ['A', '2020', '1', '1']);
    const { findings } = read(tableOf(plainHeader, ...rows));
    expect(findings.length).toBe(40);
    expect(findings[0].detail).toBe(
      `A 2020 also stands on line ${Array.from({ length: 20 }, (_, index) => index + 3).join(', ')} and more.`,
    );
  });

  it('says of a cell of a wide sheet where it stands there', () => {
    const table: Table = {
      ...tableOf(plainHeader, ['A', '2020', 'x', '1'], ['A', '2021', '2', '1']),
      lines: [5, 5],
      placeOf: (row, column) => ({
        line: 5,
        header: column < 2 ? plainHeader[column] : `${plainHeader[column]} ${2020 + row}`,
      }),
    };
    expect(places(read(table).findings)).toEqual([[5, 'mv 2020', 'x', 'not-a-number']]);
  });
});

describe('fiscal years of a panel', () => {
  const rows = [
    ['A', '31.03.2024', '1', '1'],
    ['A', 'FY2025', '1', '1'],
    ['B', '2023/24', '1', '1'],
    ['C', 'Jun 2024', '1', '1'],
    ['C', 'May 2023', '1', '1'],
    ['D', '2024', '1', '1'],
  ];
  const companies = [
    { company: 'A', endMonth: 3 },
    { company: 'B', endMonth: 5 },
  ];

  it('count as the calendar year that they end in', () => {
    const fiscalYears = { rule: 'year-of-end', usualEndMonth: 3, companies } as const;
    const { year } = read(tableOf(plainHeader, ...rows), { fiscalYears });
    expect([...year]).toEqual([2024, 2025, 2024, 2024, 2023, 2024]);
  });

  it('count as the calendar year of most of their months, by their own, their company’s or the usual end', () => {
    const fiscalYears = { rule: 'year-of-most-months', usualEndMonth: 12, companies } as const;
    const { year } = read(tableOf(plainHeader, ...rows), { fiscalYears });
    expect([...year]).toEqual([2023, 2024, 2023, 2024, 2022, 2024]);
    const usual = { rule: 'year-of-most-months', usualEndMonth: 1, companies } as const;
    expect(read(tableOf(plainHeader, ...rows), { fiscalYears: usual }).year[5]).toBe(2023);
  });

  it('of one company that count as the same calendar year are found with both lines', () => {
    const fiscalYears = { rule: 'year-of-end', usualEndMonth: 12, companies: [] } as const;
    const table = tableOf(
      plainHeader,
      ['A', '31.03.2023', '1', '1'],
      ['A', '31.12.2023', '1', '1'],
      ['B', '31.12.2023', '1', '1'],
    );
    const { findings } = read(table, { fiscalYears });
    expect(places(findings)).toEqual([
      [2, 'year', '31.03.2023', 'duplicate'],
      [3, 'year', '31.12.2023', 'duplicate'],
    ]);
    expect(findings[0].detail).toBe(
      'A has more than one fiscal year that counts as 2023: 31.03.2023 here, and line 3 (31.12.2023). Keep one of them.',
    );
    expect(findings.every(({ isBlocking }) => isBlocking)).toBeTrue();
  });

  it('that can be read with day or month first are found only where that decides the year', () => {
    const table = tableOf(
      plainHeader,
      ['A', '07/08/2023', '1', '1'],
      ['A', '03/07/2024', '1', '1'],
    );
    expect(read(table).findings).toEqual([]);
    const fiscalYears = { rule: 'year-of-most-months', usualEndMonth: 12, companies: [] } as const;
    const { findings, year } = read(table, { fiscalYears });
    expect(places(findings)).toEqual([[3, 'year', '03/07/2024', 'year']]);
    expect(findings[0].isBlocking).toBeFalse();
    expect([...year]).toEqual([2023, 2024]);
  });

  it('before the earliest year are none', () => {
    const table = tableOf(plainHeader, ['A', '23', '1', '1']);
    expect([...read(table).year]).toEqual([23]);
    expect(places(read(table, { earliestYear: 1000 }).findings)).toEqual([
      [2, 'year', '23', 'year'],
    ]);
  });
});
