import { fitContext, staleNotice } from '../ui/fit-context';
import { exampleDesk, exampleFit } from './testing/example-fit';

describe('what the frame shows around a fit', () => {
  const newerPanelVersion = { id: 'newer-panel', number: 2 };
  const overtaken = { ...exampleFit, newerPanelVersion };
  const newerGroup = { ...exampleFit.peerGroup, id: 'newer-group', number: 3 };

  it('leads from the panel over the peers to the fit', () => {
    const { lineage } = fitContext(exampleFit, exampleDesk, 'en');
    expect(lineage?.map(({ label, version }) => `${label} ${version}`)).toEqual([
      'Panel v1',
      'Peers v2',
      'Fit 6f3a91',
    ]);
  });

  it('is silent while nothing newer exists', () => {
    expect(staleNotice(exampleFit, exampleDesk)).toBeNull();
  });

  it('does not take another panel for a newer version', () => {
    const other = { ...exampleDesk.panelVersion!, id: 'other-panel', panelId: 'other', number: 9 };
    expect(staleNotice(exampleFit, { ...exampleDesk, panelVersion: other })).toBeNull();
  });

  it('offers a refit with a newer peer group', () => {
    expect(staleNotice(exampleFit, { ...exampleDesk, peerGroup: newerGroup })).toEqual({
      text: 'Peer group has a newer version, v3.',
      action: { label: 'Refit', link: '/fit/from/newer-group' },
    });
  });

  it('leads to the peers first when a newer panel has no peer group yet', () => {
    const stale = staleNotice(overtaken, exampleDesk);
    expect(stale?.text).toBe('Panel has a newer version, v2.');
    expect(stale?.action?.link).toBe('/peers');
  });

  it('leads straight to a refit when the newest peer group is on the newer panel', () => {
    const peerGroup = { ...newerGroup, panelVersionId: newerPanelVersion.id };
    const stale = staleNotice(overtaken, { ...exampleDesk, peerGroup });
    expect(stale?.action?.link).toBe('/fit/from/newer-group');
  });
});
