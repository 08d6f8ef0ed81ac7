import { flowControl } from './testing/loaded-peers';
import { specId } from './testing/peer-version';
import { peersBench, saved } from './testing/peers-bench';

describe('the Peers page on an older panel', () => {
  const { page, start, answer, load, words, press } = peersBench();

  it('says what a newer panel changed of the saved peers, when it is asked', async () => {
    start(['analyst']);
    await load(saved, [{ ...flowControl, id: specId(6), number: 2 }]);
    expect(words()).toContain(
      'The saved peers stand on Flow control v1; Flow control v2 is newer.',
    );
    await press('See what it changed for these companies');
    await answer(`/api/panel-versions/${flowControl.id}/differences/${specId(6)}`, {
      columns: [{ name: 'capex', role: 'capex' }],
      renamed: [],
      money: { currency: 'EUR', unit: 'millions' },
      addedRows: 0,
      removedRows: 0,
      changedCells: 1,
      listed: [
        {
          company: 'Kesdrin',
          year: 2019,
          kind: 'changed-cell',
          column: 'capex',
          before: 1,
          after: 2,
        },
      ],
    });
    expect(words()).toContain('Kesdrin: 1 cell changed');
    expect(document.activeElement?.textContent).toContain('Kesdrin: 1 cell changed');
  });

  it('compares no versions of different panels', async () => {
    start(['analyst']);
    await load(saved, [{ ...flowControl, id: specId(6), panelId: specId(7), number: 1 }]);
    expect(page().querySelector('kv-panel-changes')).toBeNull();
  });
});
