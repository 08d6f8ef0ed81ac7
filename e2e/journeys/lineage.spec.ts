import { expect, test } from '../pages/checked-page';
import { demoAccount } from '../pages/demo-accounts';
import { EntryPage } from '../pages/entry-page';
import { FitPage } from '../pages/fit-page';
import { PanelPage } from '../pages/panel-pages';

test('follows the standing from the Fit page to the cell of the panel that it rests on', async ({
  page,
}) => {
  await new EntryPage(page).signIn(demoAccount('analyst'));
  const fit = await new FitPage(page).openNewest();
  const standing = await fit.openFigure(/Velmara against its peers/);
  await expect(standing.drawer).toContainText('Velmara and 12 peers');
  await expect(standing.drawer).toContainText('flow-control-peers-FY2025.csv');

  await standing.showAllRows();
  const [fileRow, , ...amounts] = await standing.cells('Velmara', 2025);
  await standing.rowLink('Velmara', 2025).click();

  const panel = await new PanelPage(page).read();
  await expect(page).toHaveURL(/\/panel\/[0-9a-f-]+\?company=Velmara&year=2025$/);
  await expect(panel.focusedRow).toContainText('Velmara');
  const shown = numbersOf(await panel.focusedRow.getByRole('gridcell').allInnerTexts());
  expect(shown).toContain(2025);
  expect(shown).toContain(Number(fileRow));
  expect(amounts.length).toBeGreaterThan(2);
  for (const amount of numbersOf(amounts))
    expect(
      shown.some((each) => Math.abs(each - amount) <= 0.5),
      `${amount}`,
    ).toBe(true); // the grid rounds
});

function numbersOf(texts: readonly string[]): readonly number[] {
  return texts.map((text) => Number(text.replaceAll(',', ''))).filter((value) => !isNaN(value));
}

test('shows how far the standing depends on the choice of peers, two fits side by side', async ({
  page,
}) => {
  await new EntryPage(page).signIn(demoAccount('analyst'));
  const both = await (await new FitPage(page).openNewest()).compareTwo();
  const [first, second] = await both.figure(/^Standing/);
  expect(first).toMatch(/^[−\d][\d.,]* \(.+ to .+\)$/);
  expect(second).toMatch(/^[−\d][\d.,]* \(.+ to .+\)$/);
  expect(second).not.toBe(first);
  expect((await both.making(/^Peers|^Peer group/)).at(-1)).toBe('differs');
  expect((await both.making(/^Panel/)).at(-1)).toBe('same');
});
