import type { Locator } from '@playwright/test';
import { CheckedPage, expect, plainText } from './checked-page';
import { LineageDrawer } from './lineage-drawer';

/** Where the own company stands, and what that rests on. */
export class FitPage extends CheckedPage {
  readonly #slopes = this.page.getByRole('region', { name: 'Slopes, table' });
  readonly #companies = this.page.getByRole('region', { name: 'Companies, table' });

  /** Runs the fit as it is offered: the defaults are right without a choice. */
  async runAsOffered(): Promise<this> {
    const run = this.page.getByRole('button', { name: 'Run the fit' });
    await this.arrive(run);
    await run.click();
    return this.read();
  }

  /** Runs another fit on the same peers, with these of the form's choices taken. */
  async runWith(...choices: readonly RegExp[]): Promise<this> {
    const before = this.page.url();
    await this.page.getByRole('button', { name: 'Change specification' }).click();
    const dialog = this.page.getByRole('dialog', { name: 'Change specification' });
    for (const name of choices) await dialog.getByRole('radio', { name }).check();
    await dialog.getByRole('button', { name: 'Run the fit' }).click();
    await expect(this.page).not.toHaveURL(before);
    return this.read();
  }

  /** Year effects in their fold, a row a year. */
  async yearEffects(): Promise<readonly string[]> {
    await this.page.locator('kv-year-effects-table summary').click();
    const rows = this.page.getByRole('region', { name: 'Year effects, table' }).getByRole('row');
    return (await rows.allInnerTexts()).map(plainText).slice(1);
  }

  async openNewest(): Promise<this> {
    await this.page.goto('/fit');
    return this.read();
  }

  async read(): Promise<this> {
    return this.arrive(this.#slopes);
  }

  /** Slope, interval, standard error, t, degrees of freedom, p. */
  slope(of: 'capex' | 'book equity'): Promise<readonly string[]> {
    return this.cellsOf(this.#slopes, new RegExp(`^${of}`));
  }

  /** A company's level and what follows it in the table. */
  company(name: string): Promise<readonly string[]> {
    return this.cellsOf(this.#companies, name);
  }

  /** What stands beside a term: value, interval, test. */
  async figure(term: string | RegExp): Promise<string> {
    return plainText(await this.besideTerm(term).innerText());
  }

  async openFigure(term: string | RegExp): Promise<LineageDrawer> {
    await this.besideTerm(term).getByRole('button').click();
    return new LineageDrawer(this.page).read();
  }

  async openSlope(of: 'capex' | 'book equity'): Promise<LineageDrawer> {
    await this.#slopes
      .getByRole('row')
      .filter({ has: this.page.getByRole('rowheader', { name: new RegExp(`^${of}`) }) })
      .getByRole('button')
      .press('Enter');
    return new LineageDrawer(this.page).read();
  }

  sentence(words: RegExp): Locator {
    return this.page.getByText(words).first();
  }

  async runScenarios(): Promise<void> {
    await this.page.getByRole('link', { name: 'Run scenarios' }).click();
  }

  /** Chooses the first two fits of the list. */
  async compareTwo(): Promise<ComparePage> {
    const boxes = this.page.getByRole('checkbox', { name: /^Compare fit/ });
    await boxes.nth(0).check();
    await boxes.nth(1).check();
    await this.page.getByRole('link', { name: 'Compare the two' }).click();
    return new ComparePage(this.page).read();
  }

  async expectFits(count: number): Promise<void> {
    const rows = this.page.getByRole('region', { name: 'All fits, table' }).getByRole('rowheader');
    await expect(rows).toHaveCount(count);
  }
}

/** Two fits side by side. */
export class ComparePage extends CheckedPage {
  readonly #figures = this.page.getByRole('region', { name: 'Figures of both fits, table' });
  readonly #makings = this.page.getByRole('region', { name: /^What each fit was made from/ });

  async read(): Promise<this> {
    return this.arrive(this.#figures);
  }

  /** A figure of the first fit, then of the second. */
  figure(name: string | RegExp): Promise<readonly string[]> {
    return this.cellsOf(this.#figures, name);
  }

  /** What the first was made from, the second, and whether it is the same. */
  making(name: string | RegExp): Promise<readonly string[]> {
    return this.cellsOf(this.#makings, name);
  }
}
