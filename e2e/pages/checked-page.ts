import AxeBuilder from '@axe-core/playwright';
import {
  type BrowserContext,
  type Locator,
  type Page,
  expect,
  test as playwrightTest,
} from '@playwright/test';

/** A script that does nothing; an empty one counts as none, and axe itself would go over anew, twice 1.3 MB. */
const nothingMore = 'undefined';

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

/** Rules of axe that a colour scheme can break; all others hold in both or in none. */
export const colourRules = ['color-contrast', 'link-in-text-block'] as const;

/**
 * What axe finds against WCAG 2.2 AA on the screen, in one line each; all rules, or those that are named. Every rule
 * runs on every element; only what holds is not written out. No page of Kinvale has a frame, so axe need not open
 * another page to join the findings of frames: together that takes a half to two thirds off its time. A document keeps
 * the axe that it was given once.
 */
export async function breachesOfWcag(page: Page, rules?: readonly string[]): Promise<string[]> {
  const isThere = await page.evaluate(() => 'axe' in window);
  const axe = new AxeBuilder({ page, ...(isThere ? { axeSource: nothingMore } : {}) })
    .options({ resultTypes: ['violations'] })
    .setLegacyMode();
  const asked = rules === undefined ? axe.withTags(wcag22AA) : axe.withRules([...rules]);
  const { violations } = await asked.analyze();
  return violations.flatMap(({ id, nodes }) =>
    nodes.map((node) => `${id}: ${node.target.join(' ')}: ${node.failureSummary ?? ''}`),
  );
}

/** What each browser's page has been held to already, by address and sign. */
const held = new WeakMap<Page, Set<string>>();

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

  /**
   * Ends when the page has come, by something that stands on it alone, and axe found nothing on it. The same sign at the
   * same address is held to WCAG once.
   */
  protected async arrive(sign: Locator): Promise<this> {
    await expect(sign).toBeVisible();
    const seen = held.get(this.page) ?? new Set();
    const what = `${sign.toString()} at ${this.page.url()}`;
    if (seen.has(what)) return this;
    held.set(this.page, seen.add(what));
    expect(await breachesOfWcag(this.page), `axe on ${what}`).toEqual([]);
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
