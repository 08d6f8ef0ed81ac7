import { peerVersion } from '../testing/peer-version';
import { comparisonFinding, memberDifferences } from './member-differences';

const first = peerVersion(1, { Kesdrin: 'Pumps', Sarvane: 'Meters', Tolvane: 'Valves' });
const second = peerVersion(
  2,
  { Kesdrin: 'Pumps', Sarvane: 'Other meters', Tolvane: 'Concessions', Arvel: 'New' },
  ['Tolvane', 'Arvel'],
);

describe('what differs between two versions of a peer group', () => {
  const differences = memberDifferences(first, second);

  it('lists who moved first, then who is in one panel only, then other reasons, then the same', () => {
    expect(differences.map(({ company, kind }) => [company, kind])).toEqual([
      ['Tolvane', 'side'],
      ['Arvel', 'known'],
      ['Sarvane', 'reason'],
      ['Kesdrin', 'same'],
    ]);
    expect(differences[0].a).toEqual(jasmine.objectContaining({ isIncluded: true }));
    expect(differences[0].b).toEqual(
      jasmine.objectContaining({ isIncluded: false, reason: 'Concessions' }),
    );
    expect(differences[1].a).toBeNull();
  });

  it('counts a company that only one version knows as moved where it is in there', () => {
    const joined = peerVersion(3, { Arvel: 'New' });
    expect(memberDifferences(peerVersion(1, {}), joined)[0].kind).toBe('side');
  });

  it('is said in one sentence', () => {
    expect(comparisonFinding(first, second, differences)).toBe(
      'Version 2 leaves out Tolvane, unlike version 1',
    );
    const back = memberDifferences(second, first);
    expect(comparisonFinding(second, first, back)).toBe(
      'Version 1 takes in Tolvane, unlike version 2',
    );
    const reworded = peerVersion(3, { Kesdrin: 'Pumps', Sarvane: 'x', Tolvane: 'Valves' });
    expect(comparisonFinding(first, reworded, memberDifferences(first, reworded))).toBe(
      'Version 3 has the same peers as version 1; 1 reason differs',
    );
    expect(comparisonFinding(first, first, memberDifferences(first, first))).toBe(
      'Version 1 has the same peers as version 1',
    );
    const many = peerVersion(4, { A: '', B: '', C: '', D: '' });
    expect(comparisonFinding(first, many, memberDifferences(first, many))).toBe(
      'Version 4 takes in 4 companies and leaves out Kesdrin, Sarvane and Tolvane, unlike version 1',
    );
  });
});
