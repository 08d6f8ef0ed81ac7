import { mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { type Browser, type BrowserContext, chromium, type Page } from '@playwright/test';
import { pages, type Role } from '../backend/contract';
import startStack from '../e2e/start-stack';

/**
 * Takes a picture of every page in each role, in three sizes, light and dark, into .kinvale/pages: to be looked at.
 * `npm run screenshots -- fit board` takes the named pages alone.
 */
const sizes = [
  { width: 1440, height: 900 },
  { width: 1024, height: 768 },
  { width: 360, height: 740 },
] as const;
const schemes = ['light', 'dark'] as const;
const folder = fileURLToPath(new URL('../.kinvale/pages', import.meta.url));

interface Account {
  readonly role: Role;
  readonly email: string;
  readonly password: string;
}

async function main(): Promise<void> {
  await mkdir(folder, { recursive: true });
  const stop = process.env['KINVALE_URL'] === undefined ? await startStack() : undefined;
  const browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: ['--no-sandbox', '--disable-quic', '--disable-background-networking'],
  });
  try {
    const url = process.env['KINVALE_URL'] ?? '';
    const accounts = JSON.parse(process.env['KINVALE_ACCOUNTS'] ?? '[]') as Account[];
    await shootOutside(browser, url);
    for (const account of accounts) await shootRole(browser, url, account);
  } finally {
    await browser.close();
    await stop?.();
  }
}

async function shootOutside(browser: Browser, url: string): Promise<void> {
  const context = await open(browser, url);
  const page = await context.newPage();
  for (const path of ['sign-in', 'sign-up']) await shoot(page, `/${path}`, `nobody-${path}`);
  await context.close();
}

async function shootRole(browser: Browser, url: string, account: Account): Promise<void> {
  const context = await open(browser, url);
  const page = await context.newPage();
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(account.email);
  await page.getByLabel('Password', { exact: true }).fill(account.password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((address) => !address.pathname.startsWith('/sign-in'));
  const wanted = process.argv.slice(2);
  for (const { path, allow } of pages)
    if (
      (allow as readonly Role[]).includes(account.role) &&
      (wanted.length === 0 || wanted.includes(path))
    )
      await shoot(page, `/${path}`, `${account.role}-${path}`);
  await context.close();
}

function open(browser: Browser, url: string): Promise<BrowserContext> {
  return browser.newContext({ baseURL: url, ignoreHTTPSErrors: true, locale: 'en-GB' });
}

async function shoot(page: Page, path: string, name: string): Promise<void> {
  for (const size of sizes)
    for (const colorScheme of schemes) {
      await page.setViewportSize(size);
      await page.emulateMedia({ colorScheme });
      await page.goto(path);
      await page.waitForLoadState('networkidle');
      await page.evaluate('document.fonts.ready');
      await scrollThrough(page);
      await page.screenshot({
        path: join(folder, `${name}-${size.width}-${colorScheme}.png`),
        fullPage: true,
      });
    }
}

/** What is drawn only when it comes into view is drawn. */
async function scrollThrough(page: Page): Promise<void> {
  const { height } = page.viewportSize() ?? sizes[0];
  const total = Number(await page.evaluate('document.documentElement.scrollHeight'));
  for (let top = 0; top < total; top += height / 2) {
    await page.evaluate(`window.scrollTo(0, ${top})`);
    await page.waitForTimeout(60);
  }
  await page.waitForLoadState('networkidle');
  await page.evaluate('window.scrollTo(0, 0)');
}

await main();
