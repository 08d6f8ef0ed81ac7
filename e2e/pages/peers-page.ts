import type { Locator } from '@playwright/test';
import { CheckedPage, expect } from './checked-page';

/** The own company, and who it is compared with, each with a reason. */
export class PeersPage extends CheckedPage {
  async read(): Promise<this> {
    return this.arrive(this.page.getByLabel('Own company'));
  }

  async chooseOwn(company: string): Promise<void> {
    await this.page.getByLabel('Own company').selectOption(company);
    await expect(this.heading).toContainText(company);
  }

  async takeIn(company: string, reason: string): Promise<void> {
    const takeIn = this.page.getByRole('button', { name: `Take ${company} in`, exact: true });
    if (await takeIn.isVisible()) await takeIn.click();
    const field = this.page.getByLabel(`Why ${company} is in`, { exact: true });
    await field.fill(reason);
    await field.press('Escape');
  }

  /** How many are in and out, and whose reason is missing. */
  get counts(): Locator {
    return this.page.getByRole('status').filter({ hasText: /\d+ in, \d+ out/ });
  }

  async filterBy(header: string, value: string): Promise<void> {
    const list = this.page.getByRole('combobox', { name: header, exact: true });
    await list.press('Enter');
    await this.page.getByRole('option', { name: new RegExp(`^${value} `) }).click();
    await this.page.keyboard.press('Escape');
  }

  async showAll(): Promise<void> {
    await this.page.getByRole('button', { name: 'Show all', exact: true }).click();
  }

  /** Takes all candidates that the filters leave in, with one reason. */
  async takeAllIn(count: number, reason: string): Promise<void> {
    await this.page.getByRole('button', { name: `Take all ${count} in with one reason…` }).click();
    await this.#giveReason(reason);
  }

  async leaveRestOut(reason: string): Promise<void> {
    await this.page.getByRole('button', { name: /^Leave all \d+ out with one reason…$/ }).click();
    await this.#giveReason(reason);
  }

  /** Distances of the candidates that are listed, as they stand. */
  async distancesOut(): Promise<readonly number[]> {
    const table = this.page.getByRole('region', { name: 'Companies that are out, table' });
    const texts = await table.getByRole('button', { name: /^Distance of/ }).allInnerTexts();
    return texts.map(Number);
  }

  /** Walks the picture by arrow keys and selects a few companies. @returns how many candidates are among them. */
  async selectInPicture(steps: number): Promise<number> {
    const plane = this.page.locator('kv-company-plane');
    await this.page.locator('kv-plane-section, .picture').first().scrollIntoViewIfNeeded();
    const points = plane.getByRole('listbox');
    await this.arrive(points);
    await points.focus();
    await points.press('ArrowRight');
    for (let step = 0; step < steps; step += 1) await points.press('Shift+ArrowRight');
    const takeIn = this.page.getByRole('button', { name: /^Take \d+ in$/ });
    return Number((await takeIn.innerText()).replace(/\D/g, ''));
  }

  async moveSelected(count: number, reason: string): Promise<void> {
    await this.page.getByRole('button', { name: `Take ${count} in`, exact: true }).click();
    await this.#giveReason(reason);
  }

  /** Has the changes computed for the choice as it stands. @returns how many members were left out in turn. */
  async computeChanges(): Promise<number> {
    await this.page.getByRole('button', { name: 'Compute the changes' }).click();
    const without = this.page.getByRole('region', { name: 'Leaving each member out, table' });
    await this.arrive(without);
    await expect(this.page.getByText('not computed yet')).toHaveCount(0);
    return without.locator('tbody').getByRole('row').count();
  }

  async save(): Promise<void> {
    await expect(this.page.getByText('every reason written')).toBeVisible();
    await this.page.getByRole('button', { name: 'Save peer group' }).click();
    await this.arrive(this.#fit);
  }

  async goToFit(): Promise<void> {
    await this.#fit.click();
  }

  get #fit() {
    return this.page.getByRole('main').getByRole('link', { name: 'Fit', exact: true });
  }

  async #giveReason(reason: string): Promise<void> {
    const dialog = this.page.getByRole('dialog');
    await this.arrive(dialog.getByLabel('Reason', { exact: true }));
    await dialog.getByLabel('Reason', { exact: true }).fill(reason);
    await dialog.getByRole('button', { name: /^(Take|Leave|Give)/ }).click();
    await dialog.waitFor({ state: 'detached' });
  }
}
