import { randomLcg, randomNormal } from 'd3';
import { demoCompanies, type DemoCompany } from './demo-companies';

export { demoPeerReasons, demoPeople, demoScenarios } from './demo-story';

export const demoOwnCompany = 'Velmara';
export const demoCurrency = 'EUR';
export const demoUnit = 'millions';
export const demoYears: readonly number[] = Array.from({ length: 18 }, (_, index) => 2008 + index);

/** How much of the coming year's cycle the stock market takes in advance, as a share of its value. */
const anticipation = 0.4;
/** Share of one year's own shock that is left in the next. */
const persistence = 0.5;

/** The industry's cycle, in shares of a normal year: two slumps, a slow patch, a rebound. */
const cycle: Readonly<Record<number, number>> = {
  2008: -0.05,
  2009: -0.21,
  2010: -0.06,
  2011: 0.07,
  2012: -0.02,
  2013: 0.03,
  2014: 0.09,
  2015: 0.0,
  2016: -0.07,
  2017: 0.06,
  2018: 0.11,
  2019: 0.03,
  2020: -0.17,
  2021: 0.08,
  2022: 0.13,
  2023: -0.04,
  2024: 0.02,
  2025: 0.06,
  2026: 0.02,
};

/** Cells that the reports leave out, as people write them. */
const missing: Readonly<Record<string, string>> = {
  'Kesdrin 2010 capex': '',
  'Imbresk 2008 market_value': 'n/a',
  'Fenquora 2012 capex': '',
  'Bruxolan 2019 book_equity': '',
  'Dorvaleck 2013 employees': '',
};

const header = 'company,fiscal_year,market_value,capex,book_equity,employees,industry,country';

/** Which column of the demo panel is what, as an import's mapping says it. */
export const demoColumns = {
  company: 'company',
  year: 'fiscal_year',
  marketValue: 'market_value',
  capex: 'capex',
  bookEquity: 'book_equity',
  others: ['employees'],
  attributes: ['industry', 'country'],
} as const;

interface DemoRow {
  readonly company: string;
  readonly fiscal_year: number;
  readonly market_value: number;
  readonly capex: number;
  readonly book_equity: number;
  readonly employees: number;
  readonly industry: string;
  readonly country: string;
}

/**
 * The demo panel as a CSV file: 14 invented companies by fiscal year, EUR m with one decimal.
 * A seed gives the same file on every machine: d3's linear congruential generator and normals.
 */
export function demoPanelCsv(seed = 40_170): string {
  const draw = randomNormal.source(randomLcg(seed))(0, 1);
  const rows = demoCompanies.flatMap((company) => companyRows(company, draw));
  return [header, ...rows.map(csvLine)].join('\n') + '\n';
}

function companyRows(company: DemoCompany, draw: () => number): readonly DemoRow[] {
  const years = demoYears.filter((year) => year >= (company.firstYear ?? demoYears[0]));
  let equity = company.equity;
  let error = draw() * company.noise;
  return years.map((year, index) => {
    const done = index / (years.length - 1);
    const boom = cycle[year];
    const growth = company.growth[0] + (company.growth[1] - company.growth[0]) * done;
    if (index > 0) equity *= 1 + growth + 0.12 * boom + 0.018 * draw();
    const merged = company.merger?.year === year ? company.merger.factor : 1;
    equity *= merged;
    const swing = 1 + company.capexSwing * 1.5 * boom + 0.11 * draw();
    const capex = equity * company.capexShare * Math.max(0.35, swing);
    error = persistence * error + Math.sqrt(1 - persistence ** 2) * company.noise * draw();
    const worth = company.lasting + company.slopes[0] * capex + company.slopes[1] * equity;
    const value = worth * (1 + anticipation * cycle[year + 1]) + error;
    const heads = equity ** 0.85 * company.headcount * 2.6 * (1 + 0.02 * draw());
    return {
      company: company.name,
      fiscal_year: year,
      market_value: value,
      capex,
      book_equity: equity,
      employees: Math.round(heads / 10) * 10,
      industry: company.industry,
      country: company.country,
    };
  });
}

function csvLine(row: DemoRow): string {
  const money = (column: 'market_value' | 'capex' | 'book_equity'): string =>
    missing[`${row.company} ${row.fiscal_year} ${column}`] ?? row[column].toFixed(1);
  const employees = missing[`${row.company} ${row.fiscal_year} employees`] ?? String(row.employees);
  return [
    row.company,
    row.fiscal_year,
    money('market_value'),
    money('capex'),
    money('book_equity'),
    employees,
    row.industry,
    row.country,
  ].join(',');
}
