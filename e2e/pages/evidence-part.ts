import type { Download, Locator } from '@playwright/test';
import { CheckedPage, expect, plainText } from './checked-page';
import { FitPage } from './fit-page';

/** What speaks for and against a fit, on its page. */
export class EvidencePart extends CheckedPage {
  readonly #verdict = this.page.locator('kv-verdict-summary');
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

  /** Goes to a question by its link, and waits for its charts. */
  async goTo(question: string): Promise<Locator> {
    await this.page
      .getByRole('navigation', { name: 'Questions of the evidence' })
      .getByRole('link', { name: question })
      .click();
    const heading = this.page.getByRole('heading', { level: 3, name: question });
    await expect(heading).toBeFocused();
    await expect(heading).toBeInViewport();
    return this.page.getByRole('region', { name: question, exact: true });
  }

  /** A chart of this answer by its finding, once it is drawn. */
  async chart(answer: Locator, finding: RegExp): Promise<Locator> {
    const chart = answer.getByRole('figure', { name: finding });
    await expect(chart).toBeVisible();
    return chart;
  }

  /** Holds the page to WCAG with every chart that was gone to. */
  async holdDrawn(): Promise<void> {
    await this.arrive(this.largest);
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
