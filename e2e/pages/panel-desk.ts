import { type Download, type Locator } from '@playwright/test';
import { PanelPage } from './panel-pages';
import { expect } from './checked-page';

/** The panel page where its cells are changed: grid, flags, saving, versions. */
export class PanelDesk extends PanelPage {
  /** The table of figures; the coverage map is a grid too. */
  readonly rowsGrid: Locator = this.page.getByRole('region', { name: 'Rows' }).getByRole('grid');

  /** The row at a place of the table, the first being 1, while it is drawn. */
  rowAt(place: number): Locator {
    return this.rowsGrid.locator(`[role=row][aria-rowindex="${place + 1}"]`).first();
  }

  /** The flags of a kind, by the words of its head: `1 figure jumps …`. */
  flags(words: RegExp): Locator {
    return this.page.getByRole('heading', { level: 3, name: words });
  }

  async type(company: string, year: number, title: string, text: string): Promise<void> {
    const cell = await this.cell(company, year, title);
    await cell.click();
    await cell.press('Enter');
    await this.page.getByLabel(`${title} of ${company} in ${year}`).fill(text);
    await this.page.keyboard.press('Enter');
  }

  /** Pastes a block from the clipboard with its first cell there. */
  async paste(company: string, year: number, title: string, block: string): Promise<void> {
    await this.page.context().grantPermissions(['clipboard-read', 'clipboard-write']);
    await (await this.cell(company, year, title)).click();
    await this.page.evaluate((text) => navigator.clipboard.writeText(text), block);
    await this.page.keyboard.press('Control+v');
  }

  async undo(): Promise<void> {
    await this.page.getByRole('button', { name: /^Undo/ }).click();
  }

  async redo(): Promise<void> {
    await this.page.getByRole('button', { name: /^Redo/ }).click();
  }

  get unsaved(): Locator {
    return this.page.getByRole('status').filter({ hasText: 'not saved' });
  }

  /** Finds a flag right as it is. */
  async dismiss(place: string, reason: string): Promise<void> {
    const button = this.page.getByRole('button', { name: `Right as it is: ${place}`, exact: true });
    if (!(await button.isVisible())) await this.#openFlags();
    await button.click();
    await this.arrive(this.page.getByRole('heading', { name: 'Right as it is?' }));
    await this.page.getByLabel('Why it is right as it is').fill(reason);
    await this.page.getByRole('button', { name: 'It is right' }).click();
  }

  async save(number: number, note: string, reason: string, source: string): Promise<void> {
    await this.page.getByRole('button', { name: `Save as version ${number}…` }).click();
    await this.arrive(this.page.getByRole('heading', { name: `Save as version ${number}` }));
    await this.page.getByLabel('Note to the version').fill(note);
    await this.page.getByLabel('Same reason for all that have none').fill(reason);
    await this.page.getByLabel('Same source for all that have none').fill(source);
    const before = this.page.url();
    await this.page.getByRole('button', { name: `Save version ${number}` }).click();
    await expect(this.page).not.toHaveURL(before);
  }

  /** What each version says of the cell, the newest first or last. */
  async historyOf(company: string, year: number, title: string): Promise<readonly string[]> {
    await (await this.cell(company, year, title)).click();
    await this.page.getByRole('button', { name: 'History of this cell' }).click();
    const dialog = this.page.getByRole('dialog');
    await this.arrive(dialog.getByRole('columnheader', { name: 'Note to the version' }));
    const lines = await dialog.getByRole('row').allInnerTexts();
    await dialog.getByRole('button', { name: 'Close' }).click();
    return lines.slice(1);
  }

  async takeOut(version: string): Promise<Download> {
    const download = this.page.waitForEvent('download');
    await this.page.getByRole('link', { name: `CSV of ${version}`, exact: true }).click();
    return download;
  }

  /** Chooses two versions, by name, and compares them. @returns the table of differences. */
  async compare(older: string, newer: string): Promise<Locator> {
    for (const name of [older, newer]) {
      const box = this.page.getByRole('checkbox', { name: `Compare ${name}`, exact: true });
      await box.check();
    }
    await this.page.getByRole('button', { name: /^Compare v/ }).click();
    await this.arrive(this.page.getByRole('columnheader', { name: 'What changed' }));
    return this.page.getByRole('table').filter({
      has: this.page.getByRole('columnheader', { name: 'What changed' }),
    });
  }

  async #openFlags(): Promise<void> {
    const heads = this.page.locator('kv-flag-list h3 button[aria-expanded=false]');
    while ((await heads.count()) > 0) await heads.first().click();
  }
}
