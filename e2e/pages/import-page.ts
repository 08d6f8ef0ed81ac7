import type { Locator } from '@playwright/test';
import { CheckedPage } from './checked-page';

/** A file by its path, or by what is in it. */
export type GivenFile =
  string | { readonly name: string; readonly mimeType: string; readonly buffer: Buffer };

export function csvFile(name: string, lines: readonly string[]): GivenFile {
  return { name, mimeType: 'text/csv', buffer: Buffer.from(`${lines.join('\n')}\n`) };
}

/** From a file to a panel version. */
export class ImportPage extends CheckedPage {
  async read(): Promise<this> {
    return this.arrive(this.page.getByRole('heading', { name: 'Which column is what' }));
  }

  /** The column of the file that was taken for this. */
  column(label: string): Locator {
    return this.page.getByRole('combobox', { name: label, exact: true });
  }

  async giveMoney(currency: string, unit: string): Promise<void> {
    await this.column('Currency').fill(currency);
    await this.column('Currency').press('Tab');
    await this.column('Unit of the money columns').press('Enter');
    const list = this.page.getByRole('listbox', { name: 'Unit of the money columns' });
    await list.getByRole('option', { name: unit, exact: true }).click();
  }

  async namePanel(name: string): Promise<void> {
    await this.column('Panel name').fill(name);
    await this.column('Panel name').press('Escape');
  }

  /** Takes a column of text along with each company. */
  async takeAlong(header: string): Promise<void> {
    await this.page.getByLabel(`${header}: brought in as`, { exact: true }).selectOption('text');
  }

  async chooseLayout(words: string, item: string): Promise<void> {
    await this.page.getByLabel('Layout').selectOption({ label: words });
    await this.page.getByLabel('Column that names the variable of a row').selectOption(item);
  }

  /** How the file is read, in one sentence. */
  get reading(): Locator {
    return this.page.getByText(/^Read from .* with the columns named in line/);
  }

  async giveCurrencyColumn(column: string): Promise<void> {
    await this.page.getByLabel('Column with each row’s currency').selectOption(column);
  }

  /** @param rates  lines of currency, year, average and year-end rate, as a spreadsheet gives them. */
  async giveRates(rates: string): Promise<void> {
    const field = this.page.getByRole('textbox', { name: /^Paste rates from a spreadsheet/ });
    await field.fill(rates);
    await field.press('Tab');
  }

  /** Years belong to the calendar year that holds most of their months; this company's end in another month. */
  async endYearsOf(company: string, month: string): Promise<void> {
    await this.page.getByRole('radio', { name: /holds most of its months/ }).check();
    await this.page.getByRole('button', { name: 'Add a company' }).click();
    const field = this.page.getByLabel('Company, as in the file');
    await field.fill(company);
    await field.press('Tab');
    await this.page.getByLabel('Its years end in').selectOption({ label: month });
  }

  async check(): Promise<void> {
    await this.page.getByRole('button', { name: /^Check (the file|again)$/ }).click();
    await this.arrive(this.page.getByRole('heading', { name: 'What the check found' }));
  }

  /** Writes what a cell of the file should read. */
  async mend(line: number, column: string, text: string): Promise<void> {
    const field = this.page.getByLabel(`Line ${line}, ${column}: reads`, { exact: true });
    await field.fill(text);
    await field.press('Tab');
  }

  async leaveOut(line: number): Promise<void> {
    await this.page.getByRole('button', { name: `Leave line ${line} out`, exact: true }).click();
  }

  async readAsOne(name: string): Promise<void> {
    await this.page.getByRole('button', { name: `Read as one: ${name}`, exact: true }).click();
  }

  /** What the check says of its findings of a kind: `Text in place of a number 1`. */
  kind(words: RegExp): Locator {
    return this.page
      .getByRole('group', { name: 'Show one kind of finding' })
      .getByRole('button', { name: words });
  }

  /** What changes against the newest version of the panel, in one sentence. */
  get changes(): Locator {
    return this.page.getByText(/^Against version \d+:/);
  }

  /** Begins to bring the file in as a panel version. */
  async commit(): Promise<void> {
    await this.page.getByRole('button', { name: /^Bring in as version/ }).click();
  }

  /** How many rows are written, while they are. */
  get progress(): Locator {
    return this.page.getByRole('status').filter({ hasText: 'Writing rows' });
  }

  /** Ends the writing; the import stands there as it was checked. */
  async cancelCommit(): Promise<void> {
    await this.page.getByRole('button', { name: 'Cancel', exact: true }).click();
    await this.arrive(this.page.getByRole('heading', { name: 'Bring it in' }));
  }
}
