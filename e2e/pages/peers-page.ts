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
}
