import type { Locator } from '@playwright/test';
import { CheckedPage, expect } from './checked-page';

/** Choosing what an edition freezes, and publishing it. */
export class PublishPage extends CheckedPage {
  async open(): Promise<this> {
    await this.page.goto('/board/publish');
    return this.arrive(this.page.getByRole('heading', { name: 'As it will stand' }));
  }

  async chooseScenario(name: string): Promise<void> {
    await this.page.getByRole('checkbox', { name: new RegExp(`^${name}, version`) }).check();
  }

  async chooseFit(words: RegExp): Promise<void> {
    await this.page.getByRole('radio', { name: words }).check();
  }

  async comment(text: string): Promise<void> {
    await this.page.getByLabel('Comment for the CFO').fill(text);
  }

  async publish(number: number): Promise<EditionPage> {
    await this.page.getByRole('button', { name: `Publish edition ${number}` }).click();
    return new EditionPage(this.page).read(number);
  }
}

/** One edition as it was frozen, with its signature. */
export class EditionPage extends CheckedPage {
  async read(number: number): Promise<this> {
    await expect(
      this.page.getByText(new RegExp(`^\\s*Edition ${number} · published`)),
    ).toBeVisible();
    return this.arrive(this.page.getByRole('heading', { name: 'In five lines' }));
  }

  get signature(): Locator {
    return this.page.getByRole('heading', {
      name: /^(Signed|Returned) by |waits for a signature$/,
    });
  }

  get signButton(): Locator {
    return this.page.getByRole('button', { name: /^Sign edition/ });
  }

  text(words: string | RegExp): Locator {
    return this.page.getByText(words);
  }

  async sign(number: number, password: string): Promise<void> {
    await this.signButton.click();
    const dialog = this.page.getByRole('dialog');
    await this.arrive(dialog.getByRole('heading', { name: `Sign edition ${number}?` }));
    await dialog.getByLabel('Your password').fill(password);
    await dialog.getByRole('button', { name: `Sign edition ${number}` }).click();
    await dialog.waitFor({ state: 'detached' });
    await this.read(number);
  }

  async return(number: number, comment: string): Promise<void> {
    await this.page.getByRole('button', { name: 'Return with a comment' }).click();
    const dialog = this.page.getByRole('dialog');
    await this.arrive(dialog.getByRole('heading', { name: `Return edition ${number}?` }));
    await dialog.getByLabel('What has to change').fill(comment);
    await dialog.getByRole('button', { name: `Return edition ${number}` }).click();
    await dialog.waitFor({ state: 'detached' });
    await this.read(number);
  }
}

/** All editions of the workspace that the person may read. */
export class EditionsPage extends CheckedPage {
  readonly #table = this.page.getByRole('region', { name: 'Editions' });

  async open(): Promise<this> {
    await this.page.goto('/board/editions');
    return this.arrive(this.#table);
  }

  async openNumber(number: number): Promise<EditionPage> {
    await this.#table.getByRole('link', { name: `Edition ${number}`, exact: true }).click();
    return new EditionPage(this.page).read(number);
  }

  /** State, publication, decision, confidentiality and hash of an edition. */
  edition(number: number): Promise<readonly string[]> {
    return this.cellsOf(this.#table, `Edition ${number}`);
  }

  async states(): Promise<readonly string[]> {
    const rows = this.#table.getByRole('row').filter({ has: this.page.getByRole('rowheader') });
    return Promise.all((await rows.all()).map((row) => row.getByRole('cell').first().innerText()));
  }
}
