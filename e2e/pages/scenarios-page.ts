import type { Locator } from '@playwright/test';
import { CheckedPage, expect } from './checked-page';

export interface PlannedFigures {
  readonly expected: string;
  /** Against the base. */
  readonly difference: string;
  readonly familiar: string;
}

/** A plan by year, and what it would do to the expected value. */
export class ScenariosPage extends CheckedPage {
  readonly #figures = this.page.getByRole('region', { name: 'Figures of the plan by year' });
  readonly #others = this.page.getByRole('region', { name: 'Other scenarios of this fit' });

  async open(path = '/scenarios'): Promise<this> {
    await this.page.goto(path);
    return this.read();
  }

  async read(): Promise<this> {
    return this.arrive(this.page.getByRole('heading', { name: 'Figures by year' }));
  }

  slider(label: string): Locator {
    return this.page.getByRole('slider', { name: label, exact: true });
  }

  /** The box beside a slider: takes any number exactly. */
  box(label: string): Locator {
    return this.page.getByRole('textbox', { name: label, exact: true });
  }

  /** Moves a slider by keys, as `ArrowRight` or `PageUp`. */
  async press(label: string, key: string, times = 1): Promise<void> {
    for (let time = 0; time < times; time += 1) await this.slider(label).press(key);
  }

  async enter(label: string, amount: string): Promise<void> {
    await this.box(label).fill(amount);
    await this.box(label).press('Enter');
  }

  /** A cell of the grid by year and column, from 0. */
  cell(year: number, column: number): Locator {
    return this.page
      .getByRole('grid', { name: 'Plan by year' })
      .getByRole('row', { name: new RegExp(`^FY${year}`) })
      .getByRole('gridcell')
      .nth(column);
  }

  /** Types into a cell by keys alone, and leaves it with Enter. */
  async typeCell(year: number, column: number, text: string): Promise<void> {
    await this.cell(year, column).focus();
    await this.cell(year, column).click();
    await this.page.keyboard.press('F2');
    await this.page.keyboard.press('ControlOrMeta+a');
    await this.page.keyboard.type(text);
    await this.page.keyboard.press('Enter');
  }

  /** Pastes a block as a spreadsheet puts it on the clipboard, its first cell into this one. */
  async paste(year: number, column: number, block: string): Promise<void> {
    await this.cell(year, column).click();
    await this.cell(year, column).evaluate((cell, text) => {
      const clipboardData = new DataTransfer();
      clipboardData.setData('text/plain', text);
      cell.dispatchEvent(
        new ClipboardEvent('paste', { clipboardData, bubbles: true, cancelable: true }),
      );
    }, block);
  }

  async undoPaste(): Promise<void> {
    await this.page.getByRole('button', { name: 'Undo the paste' }).click();
  }

  async grow(label: string, percent: string): Promise<void> {
    await this.page.getByRole('button', { name: `Change rule of ${label}` }).click();
    const form = this.page.getByRole('group', { name: `Rule of ${label}` });
    await form.getByRole('combobox').first().selectOption('grow');
    await form.getByRole('textbox').fill(percent);
    await form.getByRole('button', { name: 'Set rule' }).click();
  }

  /** What the line of a rule says. */
  rule(words: RegExp): Locator {
    return this.page.getByRole('list', { name: 'Rules of the plan' }).getByText(words);
  }

  async putBack(version: number): Promise<void> {
    await this.page.getByRole('heading', { name: 'Versions' }).scrollIntoViewIfNeeded();
    await this.page.getByRole('button', { name: `Compare version ${version}` }).click();
    await this.page.getByRole('button', { name: `Put version ${version} back` }).click();
  }

  async reset(): Promise<void> {
    await this.page.getByRole('button', { name: 'Reset to base', exact: true }).click();
  }

  async addYear(year: number): Promise<void> {
    await this.page.getByRole('button', { name: `Add FY${year}` }).click();
  }

  /** What the table says of a planned year. */
  async year(year: number): Promise<PlannedFigures> {
    const cells = await this.cellsOf(this.#figures, `FY${year}`);
    const [expected, difference, familiar] = cells.slice(-3);
    return { expected, difference, familiar };
  }

  /** Ends when a moved plan has other figures: they follow at once, so the wait is short. */
  async expectDifferent(year: number, before: PlannedFigures): Promise<void> {
    const changed = async () => {
      const now = await this.year(year);
      return now.expected !== before.expected && now.difference !== before.difference;
    };
    await expect.poll(changed, { timeout: 3000 }).toBe(true);
  }

  async name(text: string): Promise<void> {
    await this.page.getByLabel('Name of the scenario').fill(text);
  }

  async save(): Promise<void> {
    await this.page.getByRole('button', { name: /^Save (scenario|as version \d+)$/ }).click();
    await expect(this.page.getByText('The server computed the same figures.')).toBeVisible();
    await this.read();
  }

  async expectDraftKept(): Promise<void> {
    await expect(this.page.getByText('Not saved; kept as your draft')).toBeVisible();
  }

  /** Says that an unsaved plan was brought back. */
  get restored(): Locator {
    return this.page.getByText(/Your unsaved plan of .* is back/);
  }

  note(words: RegExp): Locator {
    return this.page.getByRole('listitem').filter({ hasText: words });
  }

  async setToNearestInside(year: number): Promise<void> {
    await this.page
      .getByRole('button', { name: `Take the nearest plan inside for FY${year}` })
      .click();
  }

  async copy(): Promise<void> {
    await this.page.getByRole('button', { name: 'Copy', exact: true }).click();
  }

  async delete(): Promise<void> {
    await this.page.getByRole('button', { name: 'Delete', exact: true }).click();
  }

  async undo(): Promise<void> {
    await this.page.getByRole('button', { name: 'Undo', exact: true }).click();
  }

  other(name: string): Locator {
    return this.#others.getByRole('link', { name, exact: true });
  }

  get nameBox(): Locator {
    return this.page.getByLabel('Name of the scenario');
  }
}
