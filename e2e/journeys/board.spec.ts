import { expect, test } from '../pages/checked-page';
import { EditionPage, EditionsPage, PublishPage } from '../pages/board-pages';
import { invented } from '../pages/demo-accounts';
import { PreparedWorkspace } from '../pages/prepared-workspace';

test('an edition is returned with a comment that its publisher reads', async ({
  page,
  newcomer,
}) => {
  const cfo = invented('Ode Vallinger');
  const workspace = new PreparedWorkspace(page);
  await workspace.signUp(invented('Mats Ilverding'), 'Velmara board');
  await workspace.fitSample();
  const link = await workspace.invite(cfo.email, 'cfo');
  const cfoPage = await newcomer();
  await new PreparedWorkspace(cfoPage).join(link, cfo);

  await (await new PublishPage(page).open()).publish(1);
  await cfoPage.goto('/');
  const waiting = await new EditionPage(cfoPage).read(1);
  await waiting.return(1, 'Say which peers merged, and when.');
  await expect(waiting.signature).toHaveText(/Returned by Ode Vallinger on/);
  await expect(waiting.signButton).toHaveCount(0);

  const list = await new EditionsPage(page).open();
  expect((await list.edition(1))[0]).toBe('returned');
  const returned = await list.openNumber(1);
  await expect(returned.signature).toHaveText(/Returned by Ode Vallinger on/);
  await expect(returned.text('Say which peers merged, and when.')).toBeVisible();
});

test('who published an edition cannot sign it, and reads why', async ({ page, newcomer }) => {
  const both = invented('Ysolde Brankamp');
  const workspace = new PreparedWorkspace(page);
  await workspace.signUp(invented('Mats Ilverding'), 'Velmara board');
  const link = await workspace.invite(both.email, 'analyst', 'cfo');
  const bothPage = await newcomer();
  const own = new PreparedWorkspace(bothPage);
  await own.join(link, both);
  await own.fitSample();

  const edition = await (await new PublishPage(bothPage).open()).publish(1);
  await expect(edition.signature).toHaveText(/Edition 1 waits for a signature/);
  await expect(edition.signButton).toHaveCount(0);
  await expect(
    edition.text(/You published this edition: another person has to sign it/),
  ).toBeVisible();
});
