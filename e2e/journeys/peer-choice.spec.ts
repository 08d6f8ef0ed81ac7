import { candidateLines } from '../pages/candidates';
import { expect, test } from '../pages/checked-page';
import { invented } from '../pages/demo-accounts';
import { csvFile } from '../pages/import-page';
import { PanelPage } from '../pages/panel-pages';
import { PeersPage } from '../pages/peers-page';
import { PreparedWorkspace } from '../pages/prepared-workspace';

test('a peer group is chosen from 60 candidates by filters, nearness and picture', async ({
  page,
}) => {
  await new PreparedWorkspace(page).signUp(invented('Oda Fennwick'), 'Fennwick Valves');
  const file = await (
    await new PanelPage(page).openEmpty()
  ).chooseFile(csvFile('candidates.csv', candidateLines('Fennwick')));
  await file.giveMoney('EUR', 'millions');
  await file.namePanel('Candidates');
  await file.takeAlong('Industry');
  await file.takeAlong('Country');
  await file.check();
  await file.commit();
  await (await new PanelPage(page).read()).choosePeers();

  const peers = await new PeersPage(page).read();
  await peers.chooseOwn('Fennwick');
  await expect(peers.counts).toContainText('60 out');

  await test.step('filters narrow the candidates; one reason takes them in', async () => {
    await peers.filterBy('Industry', 'Pumps'); // every third of 61: Fennwick and 20 others
    await expect(peers.counts).toContainText('60 out');
    await peers.filterBy('Country', 'Denmark'); // every twelfth: Fennwick and 12, 24, 36, 48, 60
    await peers.takeAllIn(5, 'Pumps from Denmark, as ours');
    await expect(peers.counts).toContainText('5 in, 55 out');
    await peers.showAll();
  });

  await test.step('the nearest candidate stands first', async () => {
    const distances = await peers.distancesOut();
    expect(distances.length).toBe(20);
    expect([...distances].sort((left, right) => left - right)).toEqual([...distances]);
  });

  await test.step('the picture selects by keyboard', async () => {
    const count = await peers.selectInPicture(3);
    await peers.moveSelected(count, 'Alike in size and growth');
    await expect(peers.counts).not.toContainText('5 in,');
  });

  await peers.leaveRestOut('Another end market');
  await expect(peers.counts).toContainText('every reason written');

  await test.step('what each choice would change is computed before it is saved', async () => {
    const members = await peers.computeChanges();
    await expect(peers.counts).toContainText(`${members} in,`);
  });

  await peers.save();
});
