import type { Locator } from '@playwright/test';
import { CheckedPage, expect } from './checked-page';

/** How one figure came about, down to the cells of the file. */
export class LineageDrawer extends CheckedPage {
  readonly drawer: Locator = this.page.getByRole('dialog');

  async read(): Promise<this> {
    return this.arrive(this.drawer.getByRole('heading', { name: 'Formula' }));
  }

  /** A row of the panel that was used. */
  rowLink(company: string, year: number): Locator {
    return this.drawer.getByRole('link', {
      name: new RegExp(`^${company} FY${year}, .*in the panel$`),
    });
  }

  /** The cells of a row of the file: its number, the year, then the columns. */
  async cells(company: string, year: number): Promise<readonly string[]> {
    const row = this.drawer
      .getByRole('row')
      .filter({ has: this.page.getByRole('rowheader', { name: company, exact: true }) })
      .filter({ has: this.page.getByRole('cell', { name: String(year), exact: true }) });
    return row.getByRole('cell').allInnerTexts();
  }

  async showAllRows(): Promise<void> {
    await this.drawer.getByRole('button', { name: /^Show the other \d+ rows$/ }).click();
  }

  async close(): Promise<void> {
    await expect(this.drawer.locator(':focus')).toBeAttached();
    await this.page.keyboard.press('Escape');
    await this.drawer.waitFor({ state: 'detached' });
  }
}
