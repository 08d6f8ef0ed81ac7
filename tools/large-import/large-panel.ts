import type { GivenFile } from '../../e2e/pages/import-page';

const firstYear = 2000;
const years = 25;
const companies = 8000;

export const rows = companies * years;
export const firstCompany = nameOf(0);
export const lastCompany = nameOf(companies - 1);
/** Every so many companies has one figure in thousands instead of millions, and one that is missing. */
const faultEvery = 200;
export const unitSlips = companies / faultEvery;

/** 8,000 invented companies over 25 years, 6 columns: company, year, three of the model and one more. */
export function largePanelFile(): GivenFile {
  const lines = ['company,year,market_value,capex,book_equity,revenue'];
  for (let company = 0; company < companies; company++)
    for (let index = 0; index < years; index++) lines.push(line(company, index));
  const buffer = Buffer.from(`${lines.join('\n')}\n`);
  return { name: 'large-panel.csv', mimeType: 'text/csv', buffer };
}

/** Sizes grow by a few per cent a year, with a wave that differs from company to company. */
function line(company: number, index: number): string {
  const isFaulty = company % faultEvery === 0;
  const size = 200 + ((company * 7919) % 9973);
  const grown = (share: number, phase: number): number =>
    size * share * 1.04 ** index * (1 + 0.05 * Math.sin(index * 1.7 + company + phase));
  const marketValue = grown(1.4, 0) * (isFaulty && index === 12 ? 1000 : 1);
  const equity = isFaulty && index === 5 ? '' : grown(0.8, 2).toFixed(3);
  const figures = [
    marketValue.toFixed(3),
    grown(0.06, 1).toFixed(3),
    equity,
    grown(1.1, 3).toFixed(3),
  ];
  return [nameOf(company), firstYear + index, ...figures].join(',');
}

function nameOf(company: number): string {
  return `Company ${String(company).padStart(5, '0')}`;
}
