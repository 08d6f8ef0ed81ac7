import { chromium } from '@playwright/test';
import startStack from '../e2e/start-stack';
import { invented } from '../e2e/pages/demo-accounts';
import { PreparedWorkspace } from '../e2e/pages/prepared-workspace';
import { benchPanel } from './bench/bench-panel';
import { sliderRedraws } from './bench/slider-redraws';

/**
 * Measures in a real browser how long a move of a slider takes until the page shows it, from the pointer to the painted
 * frame, for plans of 5 years: `npm run bench:scenario`. Needs a build; the aims are for a machine with nothing else to do.
 */
const sizes = [
  { companies: 20, aimMs: 1000 / 60 },
  { companies: 200, aimMs: 100 },
] as const;
const observedYears = 15;
const plannedYears = 5;
const moves = 120;
const head = ['companies', 'moves', 'median ms', 'p95 ms', 'aim ms'];

async function main(): Promise<void> {
  const stop = await startStack();
  const browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: ['--no-sandbox', '--disable-quic', '--disable-background-networking'],
  });
  try {
    console.log(head.map((name) => name.padStart(12)).join(''));
    for (const { companies, aimMs } of sizes) {
      const context = await browser.newContext({
        baseURL: process.env['KINVALE_URL'] ?? '',
        ignoreHTTPSErrors: true,
        locale: 'en-GB',
        viewport: { width: 1440, height: 900 },
      });
      const page = await context.newPage();
      const workspace = new PreparedWorkspace(page);
      await workspace.signUp(invented('Runa Tessmark'), `Bench of ${companies}`);
      const panel = benchPanel(companies, observedYears);
      const version = await workspace.importCsv(csvOf(panel), mapping);
      await workspace.fitAll(version, panel.companies[0]);
      await page.goto('/scenarios');
      const first = 2000 + observedYears;
      for (let year = first + 3; year < first + plannedYears; year += 1)
        await page.getByRole('button', { name: `Add FY${year}` }).click();
      await sliderRedraws(page, `Capex FY${first}`, moves); // the first round warms up
      const times = await sliderRedraws(page, `Capex FY${first}`, moves);
      const row = [companies, times.length, at(times, 0.5), at(times, 0.95), aimMs];
      console.log(row.map((value) => String(Number(value.toFixed(1))).padStart(12)).join(''));
      await context.close();
    }
  } finally {
    await browser.close();
    await stop();
  }
}

const mapping = {
  panelName: 'Bench',
  company: 'company',
  year: 'year',
  marketValue: 'market_value',
  capex: 'capex',
  bookEquity: 'book_equity',
  others: [],
  currency: 'EUR',
  unit: 'millions',
};

function csvOf({ companies, company, year, outcome, regressors }: ReturnType<typeof benchPanel>) {
  const lines = Array.from(company, (of, row) =>
    [
      companies[of],
      year[row],
      // A market value and a book equity are above zero.
      (outcome.values[row] + 1000).toFixed(3),
      ...regressors.map(({ values }) => (values[row] + 1).toFixed(3)),
    ].join(','),
  );
  return `company,year,market_value,capex,book_equity\n${lines.join('\n')}\n`;
}

/** The value below which a share of them lies. */
function at(values: readonly number[], share: number): number {
  const sorted = values.toSorted((one, other) => one - other);
  return sorted[Math.min(sorted.length - 1, Math.floor(sorted.length * share))];
}

await main();
