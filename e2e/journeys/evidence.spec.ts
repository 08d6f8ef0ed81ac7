import { expect, test } from '../pages/checked-page';
import { demoAccount } from '../pages/demo-accounts';
import { EntryPage } from '../pages/entry-page';
import { EvidencePart } from '../pages/evidence-part';
import { PanelPage } from '../pages/panel-pages';

test.setTimeout(180_000);

test('answers what a board and an auditor ask of the newest fit', async ({ page }) => {
  await new EntryPage(page).signIn(demoAccount('analyst'));
  const evidence = await new EvidencePart(page).openNewest();
  expect(await evidence.verdict()).toMatch(/^This fit can(not)? carry /);

  await test.step('one line for all companies', async () => {
    const answer = await evidence.open('Does one line for all do?');
    await expect(answer).toContainText(/One pooled line explains [\d.]+ %/);
    await evidence.chart(answer, /^Against capex companies share a slope of /);
    await answer.getByText('Against book equity').click();
    await evidence.chart(answer, /^Against book equity companies share a slope of /);
  });

  await test.step('who drives it, and why it is a peer', async () => {
    const answer = await evidence.open('Who drives it?');
    const finding = /^Standing .+, place \d+( to \d+)? of 13; without any one company from /;
    const chart = await evidence.chart(answer, finding);
    await expect(chart.getByRole('button', { name: /^without / })).toHaveCount(12);
  });

  await test.step('the standing over the years, and trends', async () => {
    const steady = await evidence.open('Is the standing steady?');
    await expect(steady).toContainText(/The gap moves by .+ a year, p /);
    await evidence.chart(steady, /without any one year from /);
    const trends = await evidence.open('Could it be only trends?');
    await evidence.chart(trends, /in changes from year to year /);
  });

  await test.step('other intervals and other models', async () => {
    const intervals = await evidence.follow('which-intervals', 'Which intervals?');
    const chart = await evidence.chart(intervals, /the interval excludes zero in \d+ of \d+ ways$/);
    await expect(chart.getByRole('img', { name: /^CR2, default, of this fit: / })).toBeVisible();
    const models = await evidence.open('What if the model were another?');
    await evidence.chart(models, /^Standing (above|below) zero in \d of \d models that give one/);
  });

  await test.step('all tests', async () => {
    await evidence.open('What do all tests say?');
    await expect(evidence.tests.getByRole('rowheader')).toHaveCount(14);
    const [, judged, statistic, degrees, pValue] = await evidence.testRow('Poolability F');
    expect(judged).toBe('rejects');
    expect(statistic).toMatch(/^F [\d.,]+$/);
    expect(degrees).toMatch(/^12 and \d+$/);
    expect(pValue).toBe('< 0.001');
  });

  await test.step('the replication pack', async () => {
    const pack = await evidence.exportPack();
    expect(pack.suggestedFilename()).toMatch(/^kinvale-fit-[0-9a-f]{8}\.zip$/);
    expect(await pack.failure()).toBeNull();
  });

  await test.step('the row of the panel that the model misses most', async () => {
    await evidence.open('What does the model not explain?');
    await evidence.largest.getByRole('link').first().click();
    await expect(page).toHaveURL(/\/panel\/[0-9a-f-]+\?company=[^&]+&year=\d+$/);
    await expect((await new PanelPage(page).read()).focusedRow).toBeVisible();
  });
});

test('shows all answers at once, accessible and fitting, in three sizes, light and dark', async ({
  page,
}) => {
  await new EntryPage(page).signIn(demoAccount('analyst'));
  const evidence = await new EvidencePart(page).openNewest();
  await evidence.holdOpened();
});

test('runs the draws of the bootstrap beside the fit, and keeps its intervals', async ({
  page,
}) => {
  await new EntryPage(page).signIn(demoAccount('analyst'));
  const evidence = await new EvidencePart(page).openNewest();
  const answer = await evidence.open('Which intervals?');
  await evidence.chart(answer, /^Slope on capex/);
  const run = answer.getByRole('button', { name: 'Run 9,999 draws' });
  const kept = answer.getByText('9,999 draws with seed 1, kept with this fit');
  await expect(run.or(kept)).toBeVisible();
  if (await run.isVisible()) await run.click();
  await expect(kept).toBeVisible({ timeout: 60_000 });
  await expect(answer.getByRole('img', { name: /^wild bootstrap: [\d.−]+ \(/ })).toBeVisible();
  await page.reload();
  await expect(kept).toBeVisible({ timeout: 30_000 });
});
