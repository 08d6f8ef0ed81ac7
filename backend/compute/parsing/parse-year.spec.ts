import { dateOrder } from './date-order';
import type { DateOrder } from './parse-date';
import { parseFiscalYear, parseYear } from './parse-year';

describe('parseFiscalYear', () => {
  const labels: readonly (readonly [string, number])[] = [
    ['2023', 2023],
    [' 2023 ', 2023],
    ['2023.0', 2023],
    ['2023,00', 2023],
    ['FY2023', 2023],
    ['FY 2023', 2023],
    ['fy-2023', 2023],
    ['FY_2023', 2023],
    ['GJ 2023', 2023],
    ['FY23', 2023],
    ['FY 23', 2023],
    ["FY'23", 2023],
    ['GJ 79', 2079],
    ['FY80', 1980],
    ['FY99', 1999],
    ['2023/24', 2024],
    ['2023-24', 2024],
    ['2023–24', 2024],
    ['2023/2024', 2024],
    ['2023-2024', 2024],
    ['2023 / 24', 2024],
    ['FY2023/24', 2024],
    ['FY23/24', 2024],
    ['GJ 2023/24', 2024],
    ['1999/00', 2000],
    ['1999/2000', 2000],
    ['7', 7],
  ];
  for (const [text, endYear] of labels) {
    it(`reads “${text}” as the fiscal year that ends in ${endYear}`, () => {
      expect(parseFiscalYear(text)).toEqual({ endYear, endMonth: null });
    });
  }

  const dates: readonly (readonly [string, number, number])[] = [
    ['2024-03-31', 2024, 3],
    ['2024/03/31', 2024, 3],
    ['2024-3-1', 2024, 3],
    ['2024-03-31T00:00:00Z', 2024, 3],
    ['2024-03-31T23:59:59.999+02:00', 2024, 3],
    ['2024-03-31 00:00', 2024, 3],
    ['31.03.2024', 2024, 3],
    ['31.3.2024', 2024, 3],
    ['31.03.24', 2024, 3],
    ['31.12.99', 1999, 12],
    ['04.03.2024', 2024, 3],
    ['31/03/2024', 2024, 3],
    ['31-03-2024', 2024, 3],
    ['31/03/2024 12:00 AM', 2024, 3],
    ['29.02.2024', 2024, 2],
    ['Mar 2024', 2024, 3],
    ['MAR 2024', 2024, 3],
    ['Mar. 2024', 2024, 3],
    ['Mar-24', 2024, 3],
    ["Mar '24", 2024, 3],
    ['March 2024', 2024, 3],
    ['March, 2024', 2024, 3],
    ['Sept 2024', 2024, 9],
    ['31 March 2024', 2024, 3],
    ['31st March 2024', 2024, 3],
    ['31-Mar-2024', 2024, 3],
    ['31-Mar-24', 2024, 3],
    ['March 31, 2024', 2024, 3],
    ['Mar 31 2024', 2024, 3],
    ['März 2024', 2024, 3],
    ['Ma\u0308rz 2024', 2024, 3],
    ['Mrz 2024', 2024, 3],
    ['31. März 2024', 2024, 3],
    ['30. Juni 2024', 2024, 6],
    ['Mai 2024', 2024, 5],
    ['31. Dezember 2024', 2024, 12],
    ['Dez. 2024', 2024, 12],
    ['Okt 2024', 2024, 10],
    ['Jänner 2024', 2024, 1],
  ];
  for (const [text, endYear, endMonth] of dates) {
    it(`reads “${text}” as month ${endMonth} of ${endYear}`, () => {
      expect(parseFiscalYear(text)).toEqual({ endYear, endMonth });
    });
  }

  it('knows every month in both languages', () => {
    const english = 'January February March April May June July August September October';
    const german = 'Januar Februar März April Mai Juni Juli August September Oktober';
    for (const names of [english, german]) {
      names.split(' ').forEach((name, index) => {
        for (const form of [name, name.slice(0, 3)]) {
          expect(parseFiscalYear(`${form} 2024`)?.endMonth)
            .withContext(form)
            .toBe(index + 1);
        }
      });
    }
    expect(parseFiscalYear('November 2024')?.endMonth).toBe(11);
    expect(parseFiscalYear('Dec 2024')?.endMonth).toBe(12);
  });

  it('takes the month first where asked, but never with dots', () => {
    expect(parseFiscalYear('03/04/2024', 'day-first')?.endMonth).toBe(4);
    expect(parseFiscalYear('03/04/2024', 'month-first')?.endMonth).toBe(3);
    expect(parseFiscalYear('03.04.2024', 'month-first')?.endMonth).toBe(4);
    expect(parseFiscalYear('03/31/2024', 'month-first')?.endMonth).toBe(3);
  });

  it('takes nothing else for a year', () => {
    for (const text of [
      '2023.5',
      'Q1 2023',
      'x',
      '20230',
      '2022/24',
      '2023/23',
      '2023/2023',
      '23/24',
      '2024-13-01',
      '31.02.2024',
      '29.02.2023',
      '03/31/2024',
      '2024-03-00',
      '31.04/2024',
      'Foo 2024',
      '32 March 2024',
      'March',
      '2024-03-31T',
    ]) {
      expect(parseFiscalYear(text)).withContext(text).toBeUndefined();
    }
  });

  it('takes blanks, dashes and NA as missing', () => {
    for (const text of ['', ' ', 'n/a', '-', '—']) {
      expect(parseFiscalYear(text)).withContext(text).toBeNull();
    }
  });
});

describe('parseYear', () => {
  it('gives the year of the end, NaN for a missing one and undefined for any other text', () => {
    expect(parseYear('2023/24')).toBe(2024);
    expect(parseYear('n/a')).toBeNaN();
    expect(parseYear('x')).toBeUndefined();
  });
});

describe('dateOrder', () => {
  const columns: readonly (readonly [string[], DateOrder, boolean])[] = [
    [['31/03/2024', '03/04/2024'], 'day-first', false],
    [['03/31/2024', '03/04/2024'], 'month-first', false],
    [['03/31/2024', '12/31/2023', '31/12/2022'], 'month-first', false],
    [['03/31/2024', '31/12/2022'], 'day-first', false],
    [['03/04/2024', '05/06/2023'], 'day-first', true],
    [['03/03/2024'], 'day-first', false],
    [['03.04.2024', '2024', '2024-03-04'], 'day-first', false],
    [[], 'day-first', false],
  ];
  for (const [texts, order, isAmbiguous] of columns) {
    it(`reads a column of ${texts.join(' and ') || 'nothing'} ${order}`, () => {
      expect(dateOrder(texts)).toEqual({ order, isAmbiguous });
    });
  }
});
