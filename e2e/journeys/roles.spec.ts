import { type Role, apiRoutes, mayCall, maySee, pages } from '@contract';
import { EditionsPage } from '../pages/board-pages';
import { expect, test } from '../pages/checked-page';
import { demoAccount } from '../pages/demo-accounts';
import { EntryPage } from '../pages/entry-page';
import { Frame } from '../pages/frame';

const roles: readonly Role[] = ['analyst', 'cfo', 'reader', 'billing_admin'];
const someId = '00000000-0000-4000-8000-000000000000';

for (const role of roles)
  test(`shows the ${role} no page and no data but the role’s own`, async ({ page }) => {
    await new EntryPage(page).signIn(demoAccount(role));
    const frame = new Frame(page);
    const open = pages.filter((each) => maySee(each, [role]));
    expect(await frame.entries()).toEqual(open.map(({ label }) => label));

    for (const { path } of pages.filter((each) => !maySee(each, [role])))
      await frame.openNotOpen(path);

    const closed = Object.values(apiRoutes).filter(
      (route) => route.method === 'GET' && !mayCall(route, [role]),
    );
    expect(closed.length).toBeGreaterThan(0);
    for (const route of closed) {
      const reply = await page.request.get(route.path.replace(/:\w+/g, someId));
      expect(reply.status(), route.path).toBe(403);
    }
  });

test('shows a reader the signed editions only', async ({ page }) => {
  await new EntryPage(page).signIn(demoAccount('reader'));
  const list = await new EditionsPage(page).open();
  const states = await list.states();
  expect(states.length).toBeGreaterThan(0);
  for (const state of states) expect(state).toMatch(/^\s*(signed|superseded)/);
});

test('leads back to the page that was wanted before signing in', async ({ page }) => {
  await new EntryPage(page).signIn(demoAccount('billing_admin'), '/members');
  await expect(page).toHaveURL(/\/members$/);
});
