import { type Role, maySee, pages } from '@contract';
import { AnyPage } from '../pages/any-page';
import { test } from '../pages/checked-page';
import { demoAccount } from '../pages/demo-accounts';
import { EntryPage } from '../pages/entry-page';

/** Pages that the rail does not name. */
const further: Readonly<Record<Role, readonly string[]>> = {
  analyst: ['board/publish', 'no-such-page'],
  cfo: ['board/editions'],
  reader: ['board/editions', 'panel'],
  billing_admin: [],
};

test.describe.configure({ mode: 'parallel', timeout: 300_000 });

for (const role of Object.keys(further) as Role[])
  test(`every page of the ${role} is accessible and fits, in three sizes, light and dark`, async ({
    page,
  }) => {
    await new EntryPage(page).signIn(demoAccount(role));
    const any = new AnyPage(page);
    const own = pages.filter((each) => maySee(each, [role])).map(({ path }) => path);
    for (const path of [...own, ...further[role]])
      await test.step(path, async () => {
        await any.visit(`/${path}`);
        await any.holdInEverySize();
      });
  });

test('every page before signing in is accessible and fits, in three sizes, light and dark', async ({
  page,
}) => {
  const any = new AnyPage(page);
  for (const path of ['sign-in', 'sign-up', 'join'])
    await test.step(path, async () => {
      await any.visit(`/${path}`);
      await any.holdInEverySize();
    });
});
