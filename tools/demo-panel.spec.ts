import { createHash } from 'node:crypto';
import { demoPanelCsv, demoYears } from './demo-panel';

describe('the demo panel', () => {
  const lines = demoPanelCsv().trimEnd().split('\n');
  const rows = lines.slice(1).map((line) => line.split(','));
  const column = (name: string): number => lines[0].split(',').indexOf(name);
  const companies = [...new Set(rows.map(([company]) => company))];
  const cell = (company: string, year: number, name: string): number => {
    const row = rows.find((entry) => entry[0] === company && entry[1] === String(year));
    return Number(row?.[column(name)]);
  };

  it('holds 14 companies over 18 fiscal years, one of them only from 2014', () => {
    expect(lines[0]).toBe(
      'company,fiscal_year,market_value,capex,book_equity,employees,industry,country',
    );
    expect(companies.length).toBe(14);
    expect(demoYears.length).toBe(18);
    for (const company of companies) {
      const years = rows.filter((row) => row[0] === company).map((row) => Number(row[1]));
      const wanted = company === 'Yelvarno' ? demoYears.filter((year) => year >= 2014) : demoYears;
      expect(years)
        .withContext(company)
        .toEqual([...wanted]);
    }
  });

  it('leaves out five cells, none of the own company', () => {
    const gaps = rows.filter((row) => row.some((text) => text === '' || text === 'n/a'));
    expect(gaps.map((row) => row.slice(0, 2).join(' '))).toEqual([
      'Kesdrin 2010',
      'Bruxolan 2019',
      'Dorvaleck 2013',
      'Imbresk 2008',
      'Fenquora 2012',
    ]);
    expect(gaps.flat().filter((text) => text === '' || text === 'n/a').length).toBe(5);
  });

  it('says one industry and one country of each company, and shares some among several', () => {
    for (const name of ['industry', 'country']) {
      const ofCompany = new Map(rows.map((row) => [row[0], row[column(name)]]));
      for (const row of rows) {
        expect(row[column(name)]).toMatch(/^[A-Z][a-z]+( [a-z]+)*$/);
        expect(row[column(name)]).withContext(row[0]).toBe(ofCompany.get(row[0])!);
      }
      expect(new Set(ofCompany.values()).size).toBeLessThan(14);
      expect(new Set(ofCompany.values()).size).toBeGreaterThan(3);
    }
  });

  it('gives positive money with one decimal and whole employees everywhere else', () => {
    for (const row of rows) {
      for (const text of row.slice(2, 5)) {
        expect(text).toMatch(/^$|^n\/a$|^[1-9]\d*\.\d$/);
      }
      expect(row[5]).toMatch(/^$|^[1-9]\d*0$/);
    }
  });

  it('is the same file at every run, pinned by its digest, and another for another seed', () => {
    const digest = createHash('sha256').update(demoPanelCsv()).digest('hex');
    expect(digest).toBe('4d4ac6a236913a263d07f1e3f9da22a2a36cba16d8b9cdc6f0e3937d25cf95ee');
    expect(demoPanelCsv(1)).not.toBe(demoPanelCsv(2));
  });

  it('shows the merger as a jump and companies of very different size', () => {
    const before = cell('Jostrane', 2015, 'book_equity');
    expect(cell('Jostrane', 2016, 'book_equity') / before).toBeGreaterThan(1.6);
    const ratio = cell('Hostavrel', 2015, 'book_equity') / cell('Fenquora', 2015, 'book_equity');
    expect(ratio).toBeGreaterThan(14);
    expect(ratio).toBeLessThan(25);
  });
});
