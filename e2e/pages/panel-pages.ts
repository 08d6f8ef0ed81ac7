import { fileURLToPath } from 'node:url';
import type { Locator } from '@playwright/test';
import { CheckedPage, expect } from './checked-page';

/** Open data: market value, investment and capital stock of 11 companies over 20 years (Grunfeld 1958), in the order of our golden values. */
export const openDataFile = fileURLToPath(
  new URL('../../backend/stats/golden/grunfeld11_value_on_inv_capital.csv', import.meta.url),
);

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

  async chooseFile(path: string): Promise<ImportPage> {
    await this.page.getByLabel('CSV file').setInputFiles(path);
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

  async choosePeers(): Promise<void> {
    await this.page.getByRole('link', { name: 'Choose peers' }).click();
  }
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
    await this.page.getByRole('option', { name: unit, exact: true }).click();
  }

  async namePanel(name: string): Promise<void> {
    await this.column('Panel name').fill(name);
    await this.column('Panel name').press('Escape');
  }

  async check(): Promise<void> {
    await this.page.getByRole('button', { name: 'Check the file' }).click();
    await this.arrive(this.page.getByRole('heading', { name: 'What the check found' }));
  }

  async commit(): Promise<PanelPage> {
    await this.page.getByRole('button', { name: /^Bring in as version/ }).click();
    return new PanelPage(this.page).read();
  }
}
