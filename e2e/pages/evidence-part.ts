import type { Download, Locator } from '@playwright/test';
import { AnyPage } from './any-page';
import { CheckedPage, expect, plainText } from './checked-page';
import { FitPage } from './fit-page';

/** What speaks for and against a fit, on its page. */
export class EvidencePart extends CheckedPage {
  readonly #verdict = this.page.locator('kv-verdict-summary');
  readonly #questions = this.page.locator('kv-question-panels').getByRole('button', {
    expanded: false,
  });
  readonly tests = this.page.getByRole('region', { name: 'All tests, table' });
  readonly largest = this.page.getByRole('region', {
    name: 'Rows with the largest residuals, table',
  });

  /** Of the newest fit, once it has been computed. */
  async openNewest(): Promise<this> {
    await new FitPage(this.page).openNewest();
    await expect(this.#verdict).toBeVisible({ timeout: 30_000 });
    return this.arrive(this.#verdict);
  }

  async verdict(): Promise<string> {
    return plainText(await this.#verdict.getByRole('paragraph').first().innerText());
  }

  /** Opens a question that is closed. @returns its answer. */
  async open(question: string): Promise<Locator> {
    const header = this.page.getByRole('button', { name: question, exact: true });
    await expect(header).toHaveAttribute('aria-expanded', 'false');
    await header.click();
    return this.answer(question);
  }

  /** The answer to a question that is open. */
  async answer(question: string): Promise<Locator> {
    const answer = this.page.getByRole('region', { name: question, exact: true });
    await expect(answer).toBeVisible();
    return answer;
  }

  /** Goes to a question by the address that ends with its id. */
  async follow(id: string, question: string): Promise<Locator> {
    await this.page.evaluate((fragment) => {
      location.hash = fragment;
    }, id);
    const header = this.page.getByRole('button', { name: question, exact: true });
    await expect(header).toBeFocused();
    await expect(header).toBeInViewport();
    const head = await this.page.getByRole('banner').boundingBox();
    const clear = (head?.y ?? 0) + (head?.height ?? 0);
    await expect.poll(async () => (await header.boundingBox())?.y).toBeGreaterThanOrEqual(clear);
    return this.answer(question);
  }

  /** Opens whatever is closed still, and holds the page with every answer to WCAG in every size. */
  async holdOpened(): Promise<void> {
    await this.page.getByRole('button', { name: 'Open all' }).click();
    await expect(this.#questions).toHaveCount(0);
    await expect(this.page.locator('kv-question-panels figure')).toHaveCount(9);
    await new AnyPage(this.page).holdInEverySize();
  }

  /** A chart of this answer by its finding, once it is drawn. */
  async chart(answer: Locator, finding: RegExp): Promise<Locator> {
    const chart = answer.getByRole('figure', { name: finding });
    await expect(chart).toBeVisible();
    return chart;
  }

  async testRow(name: string): Promise<readonly string[]> {
    return this.cellsOf(this.tests, name);
  }

  async exportPack(): Promise<Download> {
    const download = this.page.waitForEvent('download');
    await this.page.getByRole('link', { name: 'Export replication pack' }).click();
    return download;
  }
}
