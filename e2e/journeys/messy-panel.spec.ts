import { readFile } from 'node:fs/promises';
import { expect, test } from '../pages/checked-page';
import { invented } from '../pages/demo-accounts';
import { lineOf, messyFile, soundRow } from '../pages/messy-file';
import { PanelDesk } from '../pages/panel-desk';
import { PanelPage } from '../pages/panel-pages';
import { PreparedWorkspace } from '../pages/prepared-workspace';

test('a messy panel is reviewed, mended in the grid and saved with its reasons', async ({
  page,
}) => {
  await new PreparedWorkspace(page).signUp(invented('Signe Harrowby'), 'Harrowby Group');
  const file = await (await new PanelPage(page).openEmpty()).chooseFile(messyFile());

  await test.step('the review mends what keeps the file out', async () => {
    await file.giveMoney('EUR', 'millions');
    await file.namePanel('Messy');
    await file.check();
    await expect(file.heading).toContainText('keep the file out');
    await file.mend(lineOf('Brimholt', 2016), 'Capex', String(soundRow('Brimholt', 2016).capex));
    await file.leaveOut(61); // the second row of Dunmarch in 2015, the last of the file
    await file.readAsOne('Corvane');
    await file.check();
    await expect(file.heading).toContainText('none keeps the file out');
    await file.commit();
  });

  const desk = await new PanelDesk(page).read();
  await test.step('flags stand for what is left', async () => {
    await expect(desk.heading).toContainText('6 companies, FY2014–FY2023: 1 cell missing');
    await expect(desk.heading).toContainText('1 company year without a row');
    await expect(desk.flags(/1 cell is missing/)).toBeVisible();
    await expect(desk.flags(/1 figure is zero or negative/)).toBeVisible();
    await expect(desk.flags(/1 figure looks 1,000 times too small/)).toBeVisible();
    await expect(desk.flags(/1 figure repeats the year before/)).toBeVisible();
    await expect(desk.flags(/figures? jumps?/)).toBeVisible();
    await expect(desk.flags(/1 year without a row/)).toBeVisible();
  });

  const dunmarch = String(soundRow('Dunmarch', 2018).capex);
  await test.step('cells are typed, pasted, undone and done again', async () => {
    await desk.type('Dunmarch', 2018, 'Capex', dunmarch);
    await expect(desk.unsaved).toContainText('1 cell changed in version 1');
    await expect(desk.flags(/zero or negative/)).toHaveCount(0);
    const { marketValue, capex, bookEquity } = soundRow('Fallowby', 2017);
    const block = [marketValue + 1, capex + 1, bookEquity].join('\t');
    await desk.paste('Fallowby', 2017, 'Market value', block);
    await expect(desk.unsaved).toContainText('4 cells changed in version 1');
    await expect(desk.flags(/1,000 times too small/)).toHaveCount(0);
    await desk.undo();
    await expect(desk.unsaved).toContainText('1 cell changed in version 1');
    await desk.redo();
    await expect(desk.unsaved).toContainText('4 cells changed in version 1');
  });

  await test.step('a flag is found right', async () => {
    await desk.dismiss('Brimholt FY2020 book equity', 'Nothing was retained in that year.');
    await expect(desk.flags(/repeats the year before/)).toHaveCount(0);
  });

  await test.step('version 2 keeps reason and source, and the cell tells them', async () => {
    await desk.save(2, 'Two rows mended', 'Misread in the file', 'Annual report 2018, p. 81');
    await desk.read();
    const history = await desk.historyOf('Dunmarch', 2018, 'Capex');
    expect(history).toHaveLength(2);
    expect(history.join('\n')).toContain('Annual report 2018, p. 81');
    expect(history.join('\n')).toContain('Misread in the file');
  });

  await test.step('the panel is taken out as CSV', async () => {
    const download = await desk.takeOut('Messy v2');
    const text = await readFile(await download.path(), 'utf8');
    expect(text).toContain(`Dunmarch,2018,`);
    expect(text.split(/\r?\n/).find((line) => line.startsWith('Dunmarch,2018,'))).toContain(
      dunmarch,
    );
  });
});
