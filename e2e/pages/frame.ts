import type { Locator } from '@playwright/test';
import { CheckedPage } from './checked-page';

/** What stands around every page: rail, person's menu, lineage line. */
export class Frame extends CheckedPage {
  readonly #rail = this.page.getByRole('navigation', { name: 'Pages' });

  /** Labels of the rail, in their order. */
  async entries(): Promise<readonly string[]> {
    await this.#rail.getByRole('listitem').first().waitFor();
    return this.#rail.getByRole('listitem').allInnerTexts();
  }

  async open(label: string): Promise<void> {
    await this.#rail.getByRole('link', { name: label, exact: true }).click();
  }

  /** Panel, peers, fit and scenario that the page's figures come from. */
  get lineage(): Locator {
    return this.page.getByRole('navigation', { name: 'Lineage' });
  }

  async openNotOpen(path: string): Promise<void> {
    await this.page.goto(`/${path}`);
    await this.arrive(this.page.getByRole('heading', { name: 'Your roles do not open this page' }));
  }

  async signOut(): Promise<void> {
    await this.page.getByRole('button', { name: /account and settings/ }).click();
    await this.page.getByRole('button', { name: 'Sign out' }).click();
    await this.page.waitForURL(/\/sign-in/);
  }
}
