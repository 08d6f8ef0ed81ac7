import { fileURLToPath } from 'node:url';
import type { Locator } from '@playwright/test';
import { CheckedPage, expect } from './checked-page';
import { type GivenFile, ImportPage } from './import-page';

/** Open data: market value, investment and capital stock of 11 companies over 20 years (Grunfeld 1958), in the order of our golden values. */
export const openDataFile = fileURLToPath(
  new URL('../../backend/stats/golden/grunfeld11_value_on_inv_capital.csv', import.meta.url),
);

/** As many companies as an invented panel has at most. */
const mostFinds = 70;

/** The panel: its coverage, its rows, its versions; or, where there is none, the ways to bring one in. */
export class PanelPage extends CheckedPage {
  readonly coverage: Locator = this.page.getByRole('heading', {
    name: 'Which company has figures in which year',
  });

  async openEmpty(): Promise<this> {
    await this.page.goto('/panel');
    return this.arrive(this.page.getByRole('heading', { name: 'Bring in a panel' }));
  }

  async read(): Promise<this> {
    await expect(this.grid.getByRole('row').nth(1)).toBeVisible();
    return this.arrive(this.coverage);
  }

  async chooseFile(file: GivenFile): Promise<ImportPage> {
    await this.page.getByLabel('CSV file or workbook').setInputFiles(file);
    return new ImportPage(this.page).read();
  }

  /** Brings a further file in, where there is a panel already. */
  async chooseFurtherFile(file: GivenFile): Promise<ImportPage> {
    await this.page.getByRole('button', { name: 'Bring in a file' }).click();
    return this.chooseFile(file);
  }

  /** Chooses a file that is not read: the page says why. */
  async chooseRefusedFile(file: GivenFile): Promise<void> {
    await this.page.getByLabel('CSV file or workbook').setInputFiles(file);
    await this.arrive(this.alerts);
  }

  /** Goes on with an import that was left half-way. */
  async continueWith(fileName: string): Promise<ImportPage> {
    const link = this.page.getByRole('link', { name: `Continue with ${fileName}`, exact: true });
    await this.arrive(link);
    await link.click();
    return new ImportPage(this.page).read();
  }

  async openSample(): Promise<ImportPage> {
    await this.page.getByRole('button', { name: 'Open the sample panel' }).click();
    return new ImportPage(this.page).read();
  }

  get fileChooser(): Locator {
    return this.page.getByRole('button', { name: 'Choose a file' });
  }

  get grid(): Locator {
    return this.page.getByRole('grid');
  }

  /** The row that the address asks for: the grid marks it and puts the focus there. */
  get focusedRow(): Locator {
    return this.grid.getByRole('row').filter({ has: this.page.locator(':focus') });
  }

  /** The id in the address of a panel version. */
  get versionId(): string {
    return /[0-9a-f-]{36}/.exec(this.page.url())?.[0] ?? '';
  }

  /** Has the grid show a row: it draws only those that are in view. */
  async bringUp(company: string, year: number): Promise<void> {
    const field = this.page.getByRole('searchbox', { name: 'Find' });
    await field.fill(String(year));
    const row = this.row(company, year);
    for (let steps = 0; steps < mostFinds && (await row.count()) === 0; steps += 1)
      await field.press('Enter');
    await field.fill('');
    await expect(row).toBeVisible();
  }

  /** The cell of a figure, by company, year and the column's title. */
  async cell(company: string, year: number, title: string): Promise<Locator> {
    await this.bringUp(company, year);
    const columns = await this.grid.getByRole('columnheader').allInnerTexts();
    return this.row(company, year).getByRole('gridcell').nth(columns.indexOf(title));
  }

  row(company: string, year: number): Locator {
    return this.grid
      .getByRole('row')
      .filter({ has: this.page.getByRole('gridcell', { name: company, exact: true }) })
      .filter({ has: this.page.getByRole('gridcell', { name: String(year), exact: true }) });
  }

  async choosePeers(): Promise<void> {
    await this.page.getByRole('link', { name: 'Choose peers' }).click();
  }
}
