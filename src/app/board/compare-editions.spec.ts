import { compareEditions } from './compare-editions';
import { editionContent, editionReply } from './testing/edition-content';

const settings = {
  currency: 'EUR',
  panelUnit: 'millions',
  unit: 'millions',
  negatives: 'minus',
  locale: 'en',
} as const;

describe('two editions side by side', () => {
  const other = {
    ...editionReply,
    content: {
      ...editionContent,
      panelVersion: { ...editionContent.panelVersion, currency: 'USD' },
      peerGroup: {
        ...editionContent.peerGroup,
        peers: editionContent.peerGroup.peers.slice(1),
      },
      warnings: editionContent.warnings.slice(0, 1),
    },
  };
  const compared = compareEditions(editionReply, other, settings);
  const line = (part: 'figures' | 'peers' | 'specification' | 'warnings', what: string) =>
    compared[part].find((each) => each.what === what);

  it('have each figure with its interval, in the currency of its own edition', () => {
    expect(line('figures', 'standing')).toEqual({
      what: 'standing',
      left: '1,800 (1,170 to 2,430) EUR m',
      right: '1,800 (1,170 to 2,430) USD m',
      isSame: false,
    });
    expect(line('figures', 'places')?.isSame).toBe(true);
    expect(compared.headlines[1]).toContain('USD m above what');
  });

  it('name a peer that only one of them knows', () => {
    expect(line('peers', 'Zethorin')).toEqual({
      what: 'Zethorin',
      left: 'out: Concessions at revalued amounts.',
      right: 'none',
      isSame: false,
    });
    expect(line('peers', 'Sarvane')?.isSame).toBe(true);
  });

  it('say which specification and warnings differ', () => {
    expect(line('specification', 'currency and unit')?.isSame).toBe(false);
    expect(line('specification', 'engine')?.isSame).toBe(true);
    expect(line('warnings', 'Few companies, serious')?.isSame).toBe(true);
    expect(line('warnings', 'A sign that hangs on one company, serious')?.right).toBe('none');
  });
});
