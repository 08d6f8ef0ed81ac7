import { expect, test } from '../pages/checked-page';
import { EditionPage, EditionsPage, PublishPage } from '../pages/board-pages';
import { invented } from '../pages/demo-accounts';
import { PreparedWorkspace } from '../pages/prepared-workspace';
import { ScenariosPage } from '../pages/scenarios-page';

test('an edition is returned with comments, answered by a new one, warned of, signed and compared', async ({
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

  await test.step('a headline that no figure says is refused while it is written', async () => {
    const composed = await new PublishPage(page).open();
    await composed.editHeadline(() => 'Velmara stands 987,654 above its peers');
    await expect(composed.headlineProblems).toContainText('“987,654” is no figure of this edition');
    await expect(composed.publishButton).toBeDisabled();
    await composed.takeHeadlineAsMade();
    await expect(composed.publishButton).toBeEnabled();
    await composed.publish(1);
  });

  await test.step('the CFO lands on it, comments on a part and returns it', async () => {
    await cfoPage.goto('/');
    const waiting = await new EditionPage(cfoPage).read(1);
    await waiting.comment('the slopes', 'What moved them?');
    await waiting.return(1, 'Say which peers merged, and when.');
    await expect(waiting.signature).toHaveText(/Returned by Ode Vallinger on/);
    await expect(waiting.signButton).toHaveCount(0);
  });

  await test.step('the analyst answers with a new edition, a bold plan on it', async () => {
    const plan = await new ScenariosPage(page).open();
    await plan.enter('Capex FY2026', '25000');
    await plan.name('Bold');
    await plan.save();
    const list = await new EditionsPage(page).open();
    expect((await list.edition(1))[0]).toBe('returned');
    const returned = await list.openNumber(1);
    await expect(returned.text('Say which peers merged, and when.')).toBeVisible();
    const answer = await returned.answer();
    await answer.chooseScenario('Bold');
    await answer.editHeadline((made) => `As of now: ${made}`);
    const edition = await answer.publish(2);
    await expect(edition.headline).toHaveText(/^As of now: The market values Velmara/);
    await expect(edition.text(/answers edition 1\s*$/)).toBeVisible();
    await edition.comment('the slopes', 'Nothing but the newest year.');
  });

  await test.step('the CFO finds the thread, opens each warning and signs', async () => {
    await cfoPage.goto('/');
    const waiting = await new EditionPage(cfoPage).read(2);
    await expect(waiting.thread('the slopes')).toContainText([
      /Ode Vallinger.*edition\s+1.*What moved them\?/,
      /Mats Ilverding.*edition\s+2.*Nothing but the newest year\./,
    ]);
    expect(await waiting.openSeriousWarnings()).toBeGreaterThan(0);
    await waiting.sign(2, cfo.password);
    await expect(waiting.signature).toHaveText(/Signed by Ode Vallinger on/);
    expect(await waiting.checkRecord()).toContain('Edition 2 is as it was published and signed.');
    expect(await waiting.export('PDF, Letter')).toBe('edition-2.pdf');
    expect(await waiting.export('XLSX')).toBe('edition-2.xlsx');
    await cfoPage.reload();
    await expect(waiting.accessList).toHaveText('2 people opened it, 2 exports');
  });

  await test.step('the next signed edition stands beside it in the history', async () => {
    await (await new PublishPage(page).open()).publish(3);
    await expect(new EditionPage(page).text('The specification is the same.')).toBeVisible();
    await cfoPage.goto('/');
    const waiting = await new EditionPage(cfoPage).read(3);
    await waiting.sign(3, cfo.password);
    const history = await (await new EditionsPage(page).open()).openHistory();
    const points = await history.points();
    expect(points.map((point) => point.slice(0, 9))).toEqual(['Edition 2', 'Edition 3']);
    for (const point of points) expect(point).toMatch(/: [\d,−]+ \([\d,−]+ to [\d,−]+\)$/);
    const [left, right, isSame] = await history.compare('Figures', 'standing');
    expect(left).toBe(right);
    expect(isSame).toBe('same');
  });
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
