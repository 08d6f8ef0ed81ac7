import type { PeerGroupReply } from '@contract';
import {
  changeChoice,
  changeChoices,
  chosenPeers,
  isChanged,
  isSameDraft,
  lostCompanies,
  moveDraft,
  reasonsWritten,
  startDraft,
  toSavePeerGroup,
  writtenCount,
} from './peer-draft';
import { panelCompany } from './testing/panel-company';

const companies = ['Kesdrin', 'Sarvane', 'Velmara'].map((name) => panelCompany(name));
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

  it('starts with nobody in where the panel is a pool of more than 30 companies', () => {
    const pool = Array.from({ length: 31 }, (_, place) => panelCompany(`Company ${place}`));
    const inOf = (count: number): number =>
      chosenPeers(startDraft('panel-1', pool.slice(0, count), null)).filter(
        ({ isIncluded }) => isIncluded,
      ).length;
    expect(inOf(30)).toBe(30);
    expect(inOf(31)).toBe(0);
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
    const draft = startDraft('panel-2', [...companies, panelCompany('Zethorin')], saved);
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

  it('puts several on one side with one reason, and keeps those written before unless asked', () => {
    const start = startDraft('panel-1', companies, saved);
    const both = ['Kesdrin', 'Sarvane'];
    expect(writtenCount(start, both, false)).toBe(1);
    const to = { isIncluded: false, reason: 'Other cycle', replaces: false };
    expect(chosenPeers(changeChoices(start, both, to))).toEqual([
      { company: 'Kesdrin', isIncluded: false, reason: 'Other cycle' },
      { company: 'Sarvane', isIncluded: false, reason: 'Another business' },
    ]);
    const replaced = changeChoices(start, both, { ...to, replaces: true });
    expect(chosenPeers(replaced).map(({ reason }) => reason)).toEqual([
      'Other cycle',
      'Other cycle',
    ]);
    expect(replaced.choices.get('Kesdrin')?.reasonIn).toBe('Same customers');
  });

  it('moves to another panel version and says whom it loses', () => {
    const other = [panelCompany('Kesdrin'), panelCompany('Zethorin')];
    const draft = moveDraft(startDraft('panel-1', companies, saved), 'panel-2', other);
    expect(draft.ownCompany).toBe('');
    expect([...draft.choices.keys()]).toEqual(['Kesdrin', 'Zethorin']);
    expect(lostCompanies(saved, other)).toEqual(['Sarvane']);
  });
});
