import { CheckedPage } from './checked-page';

/** Who is in the workspace, and who is asked to join. */
export class MembersPage extends CheckedPage {
  async open(): Promise<this> {
    await this.page.goto('/members');
    return this.arrive(this.page.getByRole('button', { name: 'Invite a member' }));
  }

  /** @returns the link, which is shown this once. */
  async invite(email: string, ...roles: readonly string[]): Promise<string> {
    await this.page.getByRole('button', { name: 'Invite a member' }).click();
    await this.arrive(this.page.getByRole('heading', { name: 'Invite a member' }));
    await this.page.getByLabel('E-mail address').fill(email);
    for (const role of roles) await this.page.getByRole('checkbox', { name: role }).check();
    await this.page.getByRole('button', { name: 'Make the link' }).click();
    await this.arrive(this.page.getByRole('heading', { name: `The link for ${email}` }));
    const link = await this.page.getByRole('textbox', { name: 'Link' }).inputValue();
    await this.page.getByRole('button', { name: 'Done' }).click();
    return link;
  }
}
