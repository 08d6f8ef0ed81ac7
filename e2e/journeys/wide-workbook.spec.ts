import { expect, test } from '../pages/checked-page';
import { invented } from '../pages/demo-accounts';
import { FitPage } from '../pages/fit-page';
import { inventedRows } from '../pages/invented-figures';
import { PanelPage } from '../pages/panel-pages';
import { PreparedWorkspace } from '../pages/prepared-workspace';
import { wideWorkbook } from '../pages/wide-workbook';

const european = ['Aldersee', 'Brimholt', 'Corvane', 'Dunmarch'];
const american = ['Eskerton', 'Fallowby', 'Garrowdale', 'Hollinmere'];
/** Its years end in March: most months of its FY2023 lie in 2022. */
const marchCompany = 'Garrowdale';

/** Average and year-end rate of each year: what a dollar costs in euros. */
const rates = Array.from({ length: 9 }, (_, step) => {
  const year = 2015 + step;
  return `USD\t${year}\t${year === 2022 ? '0.90' : '0.88'}\t${year === 2022 ? '0.95' : '0.86'}`;
}).join('\n');

/**
 * Worked out by hand: Garrowdale's FY2023 belongs to 2022. Its capex of USD 200 m, a flow, at the average of 2022, 0.90:
 * EUR 180 m. Its market value of USD 2,000 m, a stock, at the year-end rate of 2022, 0.95: EUR 1,900 m.
 */
const handWorked = { capex: 180, marketValue: 1900 };

test('a wide workbook in two currencies comes in, from file to fit', async ({ page }) => {
  const rows = inventedRows([...european, ...american], 2016, 8).map((row) =>
    row.company === marchCompany && row.year === 2023
      ? { ...row, capex: 200, marketValue: 2000 }
      : row,
  );
  await new PreparedWorkspace(page).signUp(invented('Runa Tessendorf'), 'Tessendorf Holding');
  const workbook = await wideWorkbook('annual-reports.xlsx', rows, (company) =>
    european.includes(company) ? 'EUR' : 'USD',
  );
  const file = await (await new PanelPage(page).openEmpty()).chooseFile(workbook);

  await test.step('the sheet is read with its years in columns', async () => {
    await expect(file.reading).toContainText('with the columns named in line 3, years in columns');
    await expect(file.column('Company')).toContainText('Company');
    await expect(file.column('Fiscal year')).toContainText('Year');
    await expect(file.column('Market value')).toContainText('Market value');
  });

  await test.step('rates are pasted, and a year that ends in March is told', async () => {
    await file.giveMoney('EUR', 'millions');
    await file.namePanel('Two currencies');
    await file.giveCurrencyColumn('Currency');
    await file.endYearsOf(marchCompany, 'March');
    await file.check();
    await expect(file.heading).toContainText('keep the file out'); // no rate yet
    await file.giveRates(rates);
    await file.check();
    await expect(file.heading).toContainText('The check found nothing to mend');
    await file.commit();
  });

  const panel = await new PanelPage(page).read();
  await test.step('the cells are converted as by hand', async () => {
    await expect(panel.heading).toContainText('8 companies, FY2015–FY2023: no cell missing');
    await panel.bringUp('Garrowdale', 2022);
    const cells = await panel.row('Garrowdale', 2022).getByRole('gridcell').allInnerTexts();
    expect(cells.map((text) => Number(text.replaceAll(',', '')))).toEqual(
      expect.arrayContaining([handWorked.marketValue, handWorked.capex]),
    );
  });

  await test.step('a figure of the fit leads to the rate', async () => {
    await new PreparedWorkspace(page).fitAll(panel.versionId, 'Aldersee');
    const fit = await new FitPage(page).openNewest();
    await expect(fit.heading).toContainText('Aldersee');
    const standing = await fit.openFigure(/Aldersee against its peers/);
    await expect(standing.drawer).toContainText('annual-reports.xlsx');
    await expect(standing.drawer).toContainText('0.95');
  });
});
