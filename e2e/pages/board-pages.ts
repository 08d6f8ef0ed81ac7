import type { Locator } from '@playwright/test';
import { CheckedPage, expect } from './checked-page';

/** Choosing what an edition freezes, and publishing it. */
export class PublishPage extends CheckedPage {
  async open(): Promise<this> {
    await this.page.goto('/board/publish');
    return this.read();
  }

  async read(): Promise<this> {
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

  /** What keeps the headline from being published, beside where it is edited. */
  get headlineProblems(): Locator {
    return this.page.getByRole('status').getByRole('listitem');
  }

  /** The headline edited in its place; it reads as it was made at first. */
  async editHeadline(change: (made: string) => string): Promise<void> {
    await this.page.getByRole('button', { name: 'Edit the headline' }).click();
    const box = this.page.getByRole('textbox', { name: 'Headline' });
    await expect(box).toBeFocused();
    await this.arrive(box);
    await box.fill(change(await box.inputValue()));
  }

  async takeHeadlineAsMade(): Promise<void> {
    await this.page.getByRole('button', { name: 'As made from the figures' }).click();
  }

  get publishButton(): Locator {
    return this.page.getByRole('button', { name: /^Publish edition/ });
  }

  async publish(number: number): Promise<EditionPage> {
    await this.page.getByRole('button', { name: `Publish edition ${number}` }).click();
    // The preview on this page has the same headings as the edition that comes.
    await this.page.waitForURL(/\/board\/[0-9a-f-]{36}$/);
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

  get headline(): Locator {
    return this.heading;
  }

  /** Opens each serious warning, one after the other, by keyboard alone. @returns how many there were. */
  async openSeriousWarnings(): Promise<number> {
    const next = this.page.getByRole('button', { name: 'Go to the next one' });
    const status = this.page.getByText(/^\d+ of \d+ serious warnings? opened\.$/);
    await expect(status).toBeVisible();
    const [, all] = (await status.innerText()).split(' of ').map(parseFloat);
    for (let opened = 0; opened < all; opened += 1) {
      await expect(this.signButton).toBeDisabled();
      await next.focus();
      await this.page.keyboard.press('Enter');
      await this.page.keyboard.press('Enter');
      await expect(status).toHaveText(new RegExp(`^${opened + 1} of ${all} `));
    }
    await expect(this.signButton).toBeEnabled();
    return all;
  }

  async comment(part: string, text: string): Promise<void> {
    await this.page.getByRole('button', { name: `Comment on ${part}`, exact: true }).click();
    const box = this.page.getByRole('textbox', { name: `Comment on ${part}` });
    await expect(box).toBeFocused();
    await this.arrive(box);
    await box.fill(text);
    await this.page.getByRole('button', { name: 'Send the comment' }).click();
    await box.waitFor({ state: 'detached' });
  }

  /** What was said of a part of the edition, with who, when and on which edition. */
  thread(part: string): Locator {
    return this.page.getByRole('list', { name: `Comments on ${part}` }).getByRole('listitem');
  }

  /** From a returned edition to the page that composes its answer. */
  async answer(): Promise<PublishPage> {
    await this.page.getByRole('link', { name: 'Answer in a new edition' }).click();
    return new PublishPage(this.page).read();
  }

  async checkRecord(): Promise<string> {
    await this.page.getByRole('button', { name: 'Check the record' }).click();
    const found = this.page.getByRole('status').getByText(/Checked \d/);
    await this.arrive(found);
    return found.innerText();
  }

  /** The file that a link gives, by its name. */
  async export(label: string): Promise<string> {
    const download = this.page.waitForEvent('download');
    await this.page.getByRole('link', { name: label, exact: true }).click();
    return (await download).suggestedFilename();
  }

  get accessList(): Locator {
    return this.page.getByText(/opened it, \d+ exports?$/);
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

  async openHistory(): Promise<HistoryPage> {
    await this.page.getByRole('link', { name: 'History' }).click();
    return new HistoryPage(this.page).read();
  }

  async states(): Promise<readonly string[]> {
    const rows = this.#table.getByRole('row').filter({ has: this.page.getByRole('rowheader') });
    return Promise.all((await rows.all()).map((row) => row.getByRole('cell').first().innerText()));
  }
}

/** The standing over the signed editions. */
export class HistoryPage extends CheckedPage {
  async read(): Promise<this> {
    return this.arrive(this.page.getByRole('region', { name: 'Signed editions' }));
  }

  /** The marks of the chart, in words. */
  async points(): Promise<readonly string[]> {
    const points = await this.page.getByRole('img', { name: /^Edition \d+/ }).all();
    return Promise.all(points.map(async (point) => (await point.getAttribute('aria-label')) ?? ''));
  }

  /** What the two editions say of this, with whether it differs. */
  async compare(part: string, what: string): Promise<readonly string[]> {
    await this.page.getByRole('link', { name: 'Set side by side' }).click();
    const table = this.page.getByRole('region', { name: part });
    await this.arrive(table);
    return this.cellsOf(table, what);
  }
}
