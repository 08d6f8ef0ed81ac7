import AxeBuilder from '@axe-core/playwright';
import {
  type BrowserContext,
  type Locator,
  type Page,
  expect,
  test as playwrightTest,
} from '@playwright/test';

const wcag22AA = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** What browsers complained about while a journey ran: console errors, page errors, breaches of the content policy. */
class Complaints {
  readonly #found: string[] = [];
  readonly #awaited: RegExp[] = [];

  async listenTo(context: BrowserContext): Promise<void> {
    await context.addInitScript(() => {
      document.addEventListener('securitypolicyviolation', (breach) => {
        const { violatedDirective, blockedURI, sourceFile, lineNumber } = breach;
        // eslint-disable-next-line no-console -- the way out of the page: we listen to its console
        console.error(
          `content policy: ${violatedDirective} refused ${blockedURI} (${sourceFile}:${lineNumber})`,
        );
      });
    });
    context.on('console', (message) => {
      if (message.type() === 'error') this.#note(`${message.text()} (${message.location().url})`);
    });
    context.on('weberror', (error) => {
      this.#note(String(error.error().stack ?? error.error()));
    });
  }

  /** A refusal that the journey provokes: browsers write each into the console. */
  expect(words: RegExp): void {
    this.#awaited.push(words);
  }

  expectNone(): void {
    expect(this.#found, 'errors in the console of the browser').toEqual([]);
  }

  #note(text: string): void {
    if (!this.#awaited.some((words) => words.test(text))) this.#found.push(text);
  }
}

/**
 * A test whose every browser is listened to: it fails on any complaint. `newcomer` opens another browser, with nobody
 * signed in.
 */
export const test = playwrightTest.extend<{
  complaints: Complaints;
  newcomer: () => Promise<Page>;
}>({
  // eslint-disable-next-line no-empty-pattern -- Playwright reads what a fixture needs from the pattern
  complaints: async ({}, use) => {
    const complaints = new Complaints();
    await use(complaints);
    complaints.expectNone();
  },
  context: async ({ context, complaints }, use) => {
    await complaints.listenTo(context);
    await use(context);
  },
  newcomer: async ({ browser, complaints }, use) => {
    const opened: BrowserContext[] = [];
    await use(async () => {
      const context = await browser.newContext();
      opened.push(context);
      await complaints.listenTo(context);
      return context.newPage();
    });
    for (const context of opened) await context.close();
  },
});

export { expect };

/** Holds what is on the screen to WCAG 2.2 AA. `hold` may be `expect.soft`, to go on and name all. */
export async function expectAccessible(
  page: Page,
  hold: typeof expect.soft = expect,
  name = page.url(),
): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).withTags(wcag22AA).analyze();
  const found = violations.flatMap(({ id, nodes }) =>
    nodes.map((node) => `${id}: ${node.target.join(' ')}: ${node.failureSummary ?? ''}`),
  );
  hold(found, `accessibility of ${name}`).toEqual([]);
}

/** A page of Kinvale: it knows what to look for, and is checked whenever it is visited. */
export abstract class CheckedPage {
  constructor(readonly page: Page) {}

  /** The page's finding. */
  get heading(): Locator {
    return this.page.getByRole('heading', { level: 1 });
  }

  /** The page's warnings, refusals and news. */
  get alerts(): Locator {
    return this.page.getByRole('alert');
  }

  /** Ends when the page has come, by something that stands on it alone, and axe found nothing on it. */
  protected async arrive(sign: Locator): Promise<this> {
    await expect(sign).toBeVisible();
    await expectAccessible(this.page);
    return this;
  }

  /** The cells of the row with this header, as they read. */
  protected async cellsOf(table: Locator, header: string | RegExp): Promise<string[]> {
    const row = table
      .getByRole('row')
      .filter({ has: this.page.getByRole('rowheader', { name: header }) });
    const texts = await row.getByRole('cell').allInnerTexts();
    return texts.map(plainText);
  }

  /** What stands beside a term of a list. */
  protected besideTerm(term: string | RegExp): Locator {
    return this.page
      .getByRole('term')
      .filter({ hasText: term })
      .locator('xpath=following-sibling::dd');
  }
}

/** Text with single spaces. */
export function plainText(text: string): string {
  return text.replace(/\s+/g, ' ').trim();
}
