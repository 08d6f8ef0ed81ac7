import { expect, test } from '../pages/checked-page';
import { invented } from '../pages/demo-accounts';
import { EntryPage } from '../pages/entry-page';
import { PanelPage } from '../pages/panel-pages';

test('an empty workspace opens the sample panel in one step and takes it in', async ({ page }) => {
  await new EntryPage(page).signUp(invented('Lieke Soranth'), 'Lower Kesting Works');
  await expect(page).toHaveURL(/\/panel$/);
  const empty = await new PanelPage(page).openEmpty();
  await expect(empty.fileChooser).toBeVisible();
  await empty.chooseRefusedFile({
    name: 'figures.xlsm',
    mimeType: 'application/vnd.ms-excel',
    buffer: Buffer.from('x'),
  });
  await expect(empty.alerts).toContainText('Expected a .csv or an .xlsx file; found figures.xlsm.');
  await expect((await empty.openSample()).heading).toContainText('none keeps the file out');
  const sample = await (await empty.openEmpty()).continueWith('sample-panel.csv');
  await sample.commit();
  const panel = await new PanelPage(page).read();
  await expect(panel.heading).toContainText(
    /^14 companies, FY2008–FY2025: \d+ cells missing, \d+ figures to look at$/,
  );
  await expect(page).toHaveURL(/\/panel\/[0-9a-f-]{36}$/);
});
