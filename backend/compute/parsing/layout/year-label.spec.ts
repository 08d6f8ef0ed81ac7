import { yearLabel } from './year-label';

describe('a header with a year', () => {
  for (const [header, year, variable, text = String(year)] of [
    ['2019', 2019, ''],
    ['2019.0', 2019, '', '2019.0'],
    ['Market value 2019', 2019, 'Market value'],
    ['FY2020 capex', 2020, 'capex', 'FY2020'],
    ['capex_2021', 2021, 'capex'],
    ['capex2021', 2021, 'capex'],
    ['2019 - Book equity (EUR m)', 2019, 'Book equity (EUR m)'],
    ['Capex (2019)', 2019, 'Capex'],
    ['Capex (EUR m), 2019', 2019, 'Capex (EUR m)'],
    ['FY23', 2023, '', 'FY23'],
    ['Capex FY 23/24', 2024, 'Capex', 'FY 23/24'],
    ['2023/24', 2024, '', '2023/24'],
    ['2022A', 2022, '', '2022'],
    ['Capex 2019-12-31', 2019, 'Capex', '2019-12-31'],
    ['31.12.2019', 2019, '', '31.12.2019'],
  ] as const) {
    it(`reads ${header}`, () => {
      const label = yearLabel(header);
      expect(label).toEqual(jasmine.objectContaining({ year, variable, text }));
    });
  }

  for (const header of [
    'Company',
    'FY',
    '23',
    'Capex 23',
    '2023E',
    'FY23E',
    'Capex 2023 est.',
    '2024 forecast',
    '2024 (plan)',
    'Q1 2023',
    '1H 2023',
    '2023 YTD',
    '1999 to 2004',
    '2019-12',
    '12019',
    '20195',
    '1500',
    'Index 2015 of 2020',
    'ISIN 2019X',
  ]) {
    it(`takes ${header} for no year of actual figures`, () => {
      expect(yearLabel(header)).toBeUndefined();
    });
  }

  it('is none in a text too long to be a header', () => {
    expect(yearLabel(`2019 ${'- '.repeat(30_000)}a`)).toBeUndefined();
  });
});
