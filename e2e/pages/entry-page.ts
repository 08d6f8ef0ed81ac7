import { CheckedPage, expect } from './checked-page';
import type { Account } from './demo-accounts';

/** Signing up, signing in, and joining by a link. */
export class EntryPage extends CheckedPage {
  async signUp(founder: Account, workspaceName: string): Promise<void> {
    await this.page.goto('/sign-up');
    await this.arrive(this.page.getByRole('heading', { name: 'Create a workspace' }));
    await this.page.getByLabel('Workspace').fill(workspaceName);
    await this.page.getByLabel('Your name').fill(founder.name);
    await this.page.getByLabel('E-mail address').fill(founder.email);
    await this.#password('Password').fill(founder.password);
    await this.page.getByRole('button', { name: 'Create workspace' }).click();
    await this.#leave('/sign-up');
  }

  async signIn(account: Account, path = '/sign-in'): Promise<void> {
    await this.page.goto(path);
    await this.arrive(this.page.getByRole('heading', { name: 'Sign in' }));
    await this.page.getByLabel('E-mail address').fill(account.email);
    await this.#password('Password').fill(account.password);
    await this.page.getByRole('button', { name: 'Sign in' }).click();
    await this.#leave('/sign-in');
  }

  /** Joins with a new account. */
  async join(link: string, account: Account): Promise<void> {
    await this.page.goto(link);
    await this.arrive(this.page.getByLabel('Your name'));
    await expect(this.page.getByLabel('E-mail address')).toHaveValue(account.email);
    await this.page.getByLabel('Your name').fill(account.name);
    await this.#password('Password').fill(account.password);
    await this.page.getByRole('button', { name: /^Join / }).click();
    await this.#leave('/join');
  }

  /** Opens a link that has been used. */
  async openUsed(link: string): Promise<void> {
    await this.page.goto(link);
    await this.arrive(this.page.getByRole('heading', { name: 'This link opens nothing any more' }));
  }

  #password(label: string) {
    return this.page.getByLabel(label, { exact: true });
  }

  #leave(path: string): Promise<void> {
    return this.page.waitForURL((address) => !address.pathname.startsWith(path));
  }
}
