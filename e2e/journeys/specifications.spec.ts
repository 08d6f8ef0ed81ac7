import { expect, test } from '../pages/checked-page';
import { invented } from '../pages/demo-accounts';
import { FitPage } from '../pages/fit-page';
import { PreparedWorkspace } from '../pages/prepared-workspace';
import { ScenariosPage } from '../pages/scenarios-page';

const percent = String.raw`[−\d.,]+ % \([−\d.,]+ to [−\d.,]+ %\)`;

test('reads standing and plan of a fit in logs and of one with year effects', async ({ page }) => {
  const workspace = new PreparedWorkspace(page);
  await workspace.signUp(invented('Sorrel Aldane'), 'Velmara specifications');
  await workspace.fitSample();
  const fit = await new FitPage(page).openNewest();

  await test.step('in logs the standing is a percentage and the slopes are elasticities', async () => {
    await fit.runWith(/^Logs/);
    await expect(fit.heading).toHaveText(new RegExp(`Velmara .*${percent}`));
    expect(await fit.figure(/Velmara against its peers/)).toMatch(new RegExp(`^${percent}$`));
    expect(await fit.figure(/Drift of the gap a year, percent/)).toMatch(/ %/);
    expect(await fit.figure(/Residual standard error, natural logs/)).toMatch(/^0\.\d+$/);
    await expect(fit.sentence(/1 % more capex goes with [\d.]+ % (more|less)/)).toBeVisible();
  });

  await test.step('a plan through it has amounts as means and differences in percent', async () => {
    await fit.runScenarios();
    const plan = await new ScenariosPage(page).read();
    await expect(page.getByText('This fit reads logs:', { exact: false })).toBeVisible();
    await plan.press('Capex FY2026', 'PageUp');
    await expect
      .poll(async () => (await plan.year(2026)).difference)
      .toMatch(/^[+−][\d.,]+ % \([−\d.,]+ to [−\d.,]+ %\)$/);
    expect((await plan.year(2026)).expected).toMatch(/^[\d.,]+ \([\d.,]+ to [\d.,]+\)$/);
    await plan.enter('Capex FY2026', '0');
    await expect(page.getByText('expected an amount above zero')).toBeVisible();
    await plan.press('Capex FY2026', 'ArrowRight');
    await plan.name('In logs');
    await plan.save();
  });

  await test.step('with year effects the standing is an amount again and the years have a table', async () => {
    await fit.openNewest();
    await fit.runWith(/^Company levels and year effects/, /^Amounts/);
    await expect(fit.heading).not.toContainText('%');
    expect(await fit.figure('R² within, both effects taken out')).toMatch(/^0\.\d+$/);
    expect((await fit.yearEffects()).length).toBeGreaterThan(5);
  });

  await test.step('a plan through it says which year effect it takes', async () => {
    await fit.runScenarios();
    const plan = await new ScenariosPage(page).read();
    await expect(
      page.getByText(/Year effect of every planned year: that of FY\d{4}/),
    ).toBeVisible();
    const before = await plan.year(2026);
    await plan.press('Capex FY2026', 'PageUp');
    await plan.expectDifferent(2026, before);
    await plan.name('With year effects');
    await plan.save();
  });
});
