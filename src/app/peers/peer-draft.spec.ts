import type { PeerGroupReply } from '@contract';
import { nearestFirst, sizeDistance } from './nearness';
import {
  type PanelCompany,
  changeChoice,
  chosenPeers,
  isChanged,
  isSameDraft,
  lostCompanies,
  moveDraft,
  reasonsWritten,
  startDraft,
  toSavePeerGroup,
} from './peer-draft';

function company(name: string, marketValue: number | null = 100): PanelCompany {
  return {
    name,
    rows: 10,
    completeRows: 10,
    firstYear: 2010,
    lastYear: 2019,
    marketValue,
    capex: null,
    bookEquity: null,
  };
}

const companies = ['Kesdrin', 'Sarvane', 'Velmara'].map((name) => company(name));
const saved: PeerGroupReply = {
  id: 'group-2',
  number: 2,
  panelVersionId: 'panel-1',
  ownCompany: 'Velmara',
  peerCount: 1,
  note: '',
  createdAt: '2026-03-04T12:00:00.000Z',
  createdBy: 'Ilvo Brenn',
  peers: [
    { company: 'Kesdrin', isIncluded: true, reason: 'Same customers' },
    { company: 'Sarvane', isIncluded: false, reason: 'Another business' },
  ],
};

describe('a choice of peers before it is saved', () => {
  it('takes everybody in where nothing is saved yet, and no own company', () => {
    const draft = startDraft('panel-1', companies, null);
    expect(draft.ownCompany).toBe('');
    expect(chosenPeers(draft).every(({ isIncluded }) => isIncluded)).toBeTrue();
  });

  it('starts from the saved version without being changed', () => {
    const draft = startDraft('panel-1', companies, saved);
    expect(isChanged(draft, saved)).toBeFalse();
    expect(toSavePeerGroup(draft, ' a note ', 'group-2')).toEqual({
      panelVersionId: 'panel-1',
      ownCompany: 'Velmara',
      note: 'a note',
      parentId: 'group-2',
      peers: saved.peers,
    });
  });

  it('leaves a company that is new in the panel outside and without a reason', () => {
    const draft = startDraft('panel-2', [...companies, company('Zethorin')], saved);
    expect(chosenPeers(draft)).toContain({ company: 'Zethorin', isIncluded: false, reason: '' });
    expect(isChanged(draft, saved)).toBeTrue();
  });

  it('keeps the reason of each side when a company moves there and back', () => {
    const start = startDraft('panel-1', companies, saved);
    const out = changeChoice(start, 'Kesdrin', { isIncluded: false, reasonOut: 'Sold' });
    expect(chosenPeers(out)[0]).toEqual({ company: 'Kesdrin', isIncluded: false, reason: 'Sold' });
    const back = changeChoice(out, 'Kesdrin', { isIncluded: true });
    expect(chosenPeers(back)).toEqual(saved.peers);
    expect(isChanged(back, saved)).toBeFalse();
    expect(isSameDraft(back, start)).toBeFalse();
  });

  it('offers every reason once', () => {
    const start = startDraft('panel-1', companies, saved);
    const draft = changeChoice(start, 'Sarvane', { reasonIn: 'Same customers ' });
    expect(reasonsWritten(draft)).toEqual(['Same customers', 'Another business']);
  });

  it('moves to another panel version and says whom it loses', () => {
    const other = [company('Kesdrin'), company('Zethorin')];
    const draft = moveDraft(startDraft('panel-1', companies, saved), 'panel-2', other);
    expect(draft.ownCompany).toBe('');
    expect([...draft.choices.keys()]).toEqual(['Kesdrin', 'Zethorin']);
    expect(lostCompanies(saved, other)).toEqual(['Sarvane']);
  });
});

describe('nearness in size', () => {
  it('is the mean logarithmic ratio of what both report', () => {
    expect(sizeDistance(company('a', 200), company('b', 100))).toBeCloseTo(Math.log(2), 12);
    expect(sizeDistance(company('a', null), company('b', 100))).toBe(Infinity);
    expect(sizeDistance(company('a', -5), company('b', 100))).toBe(Infinity);
  });

  it('puts the nearest first, whether larger or smaller, and names in order where nothing is known', () => {
    const list = [
      company('Far', 1000),
      company('Nobody', null),
      company('Half', 50),
      company('Any', null),
    ];
    expect(nearestFirst(list, company('Velmara', 90)).map(({ name }) => name)).toEqual([
      'Half',
      'Far',
      'Any',
      'Nobody',
    ]);
    expect(nearestFirst(list, undefined)[0].name).toBe('Any');
  });
});
