import { expect, test } from '../pages/checked-page';
import { EditionPage, EditionsPage, PublishPage } from '../pages/board-pages';
import { invented } from '../pages/demo-accounts';
import { EntryPage } from '../pages/entry-page';
import { EvidencePart } from '../pages/evidence-part';
import { FitPage } from '../pages/fit-page';
import { Frame } from '../pages/frame';
import { MembersPage } from '../pages/members-page';
import { PanelPage, openDataFile } from '../pages/panel-pages';
import { PeersPage } from '../pages/peers-page';
import { PreparedWorkspace } from '../pages/prepared-workspace';
import { ScenariosPage } from '../pages/scenarios-page';

const companies = Array.from(
  { length: 11 },
  (_, index) => `C${String(index + 1).padStart(2, '0')}`,
);

test.setTimeout(240_000);

/** Figures: R 4.2.2 (lm, plm, clubSandwich); standings and rank sets from dummy regressions in numpy. */
test('from a file to a signed edition, with the figures that R gives', async ({
  page,
  newcomer,
  complaints,
}) => {
  const founder = invented('Hedda Marlowen');
  const cfo = invented('Piet Kalderon');
  await new EntryPage(page).signUp(founder, 'Orlamere Holding');

  const link = await (await new MembersPage(page).open()).invite(cfo.email, 'CFO');
  const cfoPage = await newcomer();
  await new EntryPage(cfoPage).join(link, cfo);
  complaints.expect(/410 \(Gone\).*invitations\/view/);
  await new EntryPage(await newcomer()).openUsed(link);

  await test.step('the panel comes in by its file', async () => {
    const file = await (await new PanelPage(page).openEmpty()).chooseFile(openDataFile);
    await expect(file.column('Company')).toContainText('company');
    await expect(file.column('Fiscal year')).toContainText('year');
    await expect(file.column('Market value')).toContainText('value');
    await expect(file.column('Capex')).toContainText('inv');
    await expect(file.column('Book equity')).toContainText('capital');
    await file.giveMoney('USD', 'millions');
    await file.check();
    await expect(file.heading).toContainText('The check found nothing to mend');
    await file.commit();
    const panel = await new PanelPage(page).read();
    await expect(panel.heading).toHaveText(/11 companies, FY1935–FY1954: no cell missing/);
    await panel.choosePeers();
  });

  const fit = new FitPage(page);
  await test.step('C06 is fitted among the ten others', async () => {
    await compare(new PeersPage(page), 'C06');
    await fit.runAsOffered();
    await expect(fit.heading).toHaveText(
      /C06\s+stands 2,410 \(1,270 to 3,540\) above its peers, place 1 of 11/,
    );
  });

  await test.step('the tables read as R computed them', async () => {
    await new EvidencePart(page).open('Does one line for all do?');
    expect(await fit.slope('capex')).toEqual([
      '2.856',
      '−1.264 to 6.976',
      '0.9884',
      '2.890',
      '2.07',
      '0.098',
    ]);
    expect((await fit.slope('book equity'))[0]).toBe('−0.5079');
    expect((await fit.slope('book equity'))[4]).toBe('3.46');
    expect(await fit.figure('R², company levels')).toBe('0.9626');
    expect(await fit.figure('R², one pooled line')).toBe('0.7530');
    expect(await fit.figure('F, whole model')).toMatch(/^443\.7 on 12 and 207\b/);
    expect(await fit.figure('F, company levels')).toMatch(/^115\.9 on 10 and 207\b/);
    expect(await fit.figure(/C06 against its peers/)).toMatch(/^2,407 \(1,275 to 3,539\)$/);
    expect(await fit.figure('Places the data cannot rule out')).toBe('place 1 of 11');
    await expect(fit.sentence(/Rests on 2\.07 degrees of freedom/)).toBeVisible();
    await expect(fit.sentence(/Rests on 3\.46 degrees of freedom/)).toBeVisible();
  });

  await test.step('the lineage drawer gives them at full precision', async () => {
    const exact = async (drawer: Awaited<ReturnType<FitPage['openFigure']>>, value: RegExp) => {
      await expect(drawer.drawer.getByText(value).first()).toBeVisible();
      await drawer.close();
    };
    await exact(await fit.openSlope('capex'), /2\.85608119\d*/);
    await exact(await fit.openSlope('book equity'), /[−-]0\.50786726\d*/);
    await exact(await fit.openFigure('R², company levels'), /0\.96257498\d*/);
    await exact(await fit.openFigure('R², one pooled line'), /0\.75295585\d*/);
    await exact(await fit.openFigure('F, whole model'), /443\.671651\d*/);
    await exact(await fit.openFigure('F, company levels'), /115\.941596\d*/);
    const standing = await fit.openFigure(/C06 against its peers/);
    await expect(standing.drawer.getByText(/1,274\.965\d* to 3,539\.084\d*/)).toBeVisible();
    await exact(standing, /2,407\.02464\d* USD m/);
    await exact(await fit.openFigure('Places the data cannot rule out'), /place 1 of 11/);
  });

  await test.step('C05 as own company is a version of its own', async () => {
    await new Frame(page).open('Peers');
    await compare(new PeersPage(page), 'C05');
    await fit.runAsOffered();
    await expect(fit.heading).toContainText('C05');
    expect(await fit.figure(/C05 against its peers/)).toMatch(/^1,225 \(1,035 to 1,416\)$/);
    expect(await fit.figure('Places the data cannot rule out')).toBe('place 2 to 3 of 11');
    await fit.expectFits(2);
  });

  await test.step('a plan is made by keyboard and saved', async () => {
    await fit.runScenarios();
    const plan = await new ScenariosPage(page).read();
    const before = await plan.year(1955);
    await plan.press('Capex FY1955', 'ArrowRight', 3);
    await plan.expectDifferent(1955, before);
    await plan.name('Somewhat more capex');
    await plan.save();
  });

  await test.step('an edition is published and its publisher cannot sign it', async () => {
    const publish = await new PublishPage(page).open();
    await publish.chooseScenario('Somewhat more capex');
    await publish.comment('The slopes rest on few degrees of freedom.');
    const edition = await publish.publish(1);
    await expect(edition.signature).toHaveText(/Edition 1 waits for a signature/);
    await expect(edition.signButton).toHaveCount(0);
  });

  await test.step('the CFO lands on it and signs it', async () => {
    await cfoPage.goto('/');
    const edition = await new EditionPage(cfoPage).read(1);
    await expect(edition.text('The slopes rest on few degrees of freedom.')).toBeVisible();
    expect(await edition.openSeriousWarnings()).toBeGreaterThan(0);
    await edition.sign(1, cfo.password);
    await expect(edition.signature).toHaveText(/Signed by Piet Kalderon on/);
    const list = await new EditionsPage(page).open();
    expect((await list.edition(1))[0]).toMatch(/signed/);
    await list.openNumber(1);
    await expect(new EditionPage(page).signature).toHaveText(/Signed by Piet Kalderon on/);
  });

  await test.step('a reader who joins then lands on the signed edition', async () => {
    const reader = invented('Cato Brevick');
    const readerPage = await newcomer();
    const token = await new PreparedWorkspace(page).invite(reader.email, 'reader');
    await new PreparedWorkspace(readerPage).join(token, reader);
    await readerPage.goto('/');
    const edition = await new EditionPage(readerPage).read(1);
    await expect(edition.signature).toHaveText(/Signed by Piet Kalderon on/);
    expect(await new Frame(readerPage).entries()).toEqual(['Board']);
  });
});

/** Makes one company the own one and all others its peers, each with a reason. */
async function compare(peers: PeersPage, own: string): Promise<void> {
  await peers.read();
  await peers.chooseOwn(own);
  for (const company of companies.filter((each) => each !== own))
    await peers.takeIn(company, `Open data, same years; no reason to leave ${company} out.`);
  await peers.save();
  await peers.goToFit();
}
