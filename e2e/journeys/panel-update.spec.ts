import { expect, test } from '../pages/checked-page';
import { invented } from '../pages/demo-accounts';
import { FitPage } from '../pages/fit-page';
import { csvFile } from '../pages/import-page';
import { csvLines, inventedRows } from '../pages/invented-figures';
import { PanelDesk } from '../pages/panel-desk';
import { PanelPage } from '../pages/panel-pages';
import { PreparedWorkspace } from '../pages/prepared-workspace';

const companies = ['Aldersee', 'Brimholt', 'Corvane', 'Dunmarch', 'Eskerton', 'Fallowby'];
const changedCells = 30;

test('an update shows what it changes, and the old fit says that its panel is older', async ({
  page,
}) => {
  const rows = inventedRows(companies, 2014, 10);
  const restated = rows.map((row, place) =>
    place % 2 === 0 ? { ...row, bookEquity: Math.round(row.bookEquity * 102) / 100 } : row,
  );
  expect(restated.filter((row, place) => row !== rows[place]).length).toBe(changedCells);

  const workspace = new PreparedWorkspace(page);
  await workspace.signUp(invented('Maive Orrund'), 'Orrund Works');
  const first = await (
    await new PanelPage(page).openEmpty()
  ).chooseFile(csvFile('figures.csv', csvLines(rows)));
  await first.giveMoney('EUR', 'millions');
  await first.namePanel('Figures');
  await first.check();
  await first.commit();
  const desk = await new PanelDesk(page).read();
  await workspace.fitAll(desk.versionId, 'Aldersee');

  await test.step('the changes stand there before the update is brought in', async () => {
    const update = await desk.chooseFurtherFile(csvFile('restated.csv', csvLines(restated)));
    await update.giveMoney('EUR', 'millions');
    await update.namePanel('Figures');
    await update.check();
    await expect(update.changes).toHaveText(
      `Against version 1: 0 rows come, 0 rows go and ${changedCells} cells change.`,
    );
    await update.commit();
    await desk.read();
  });

  await test.step('the two versions differ by them', async () => {
    const differences = await desk.compare('Figures v1', 'Figures v2');
    await expect(differences.getByRole('rowheader')).toHaveCount(changedCells);
    await expect(differences.getByRole('row').nth(1)).toContainText('Aldersee');
  });

  await test.step('the fit of version 1 says that there is a newer one', async () => {
    const fit = await new FitPage(page).openNewest();
    await expect(fit.sentence(/Panel has a newer version, v2\./)).toBeVisible();
  });
});
