import { type ImportFinding, noMending } from '@contract';
import {
  afterAct,
  alikeFindings,
  beforeAct,
  isStanding,
  leaveOutOffers,
  textKey,
  useForAllOffer,
} from './bulk-mending';
import { withCell, withoutLine } from './mending';

function finding(row: number, change: Partial<ImportFinding> = {}): ImportFinding {
  const rest = { column: 'year', found: 'FY-19', code: 'year', detail: '' } as const;
  return { row, isBlocking: true, ...rest, ...change };
}

const duplicates = [2, 3, 4, 5].map((row) =>
  finding(row, { code: 'duplicate', found: '2019', ...(row > 3 && { sameAs: row - 2 }) }),
);

describe('mending many findings in one act', () => {
  it('leaves out all lines of a kind, and takes them again as one', () => {
    const [offer] = leaveOutOffers([finding(2), finding(3), finding(3)], noMending, null);
    expect(offer.label).toBe('Leave out all 2 lines: Not a year');
    const before = withoutLine(noMending, 9);
    const after = afterAct(before, offer.act);
    expect(after.excludedRows).toEqual([9, 2, 3]);
    expect(isStanding(after, offer.act)).toBeTrue();
    expect(beforeAct(after, offer.act)).toEqual(before);
    expect(isStanding(before, offer.act)).toBeFalse();
    expect(leaveOutOffers([finding(2), finding(3)], after, null)).toEqual([]);
  });

  it('keeps the first of the rows that stand twice', () => {
    const [offer] = leaveOutOffers(duplicates, noMending, 'duplicate');
    expect(offer.act.lines).toEqual([4, 5]);
    expect(offer.label).toContain('keep the first of each');
  });

  it('offers no gap, and of the chosen kind only', () => {
    const gaps = [finding(2), finding(3)].map((each) => ({
      ...each,
      ...{ code: 'missing' as const, isBlocking: false },
    }));
    expect(leaveOutOffers(gaps, noMending, null)).toEqual([]);
    expect(leaveOutOffers([...duplicates, finding(8), finding(9)], noMending, null).length).toBe(2);
    expect(leaveOutOffers(duplicates, noMending, 'year')).toEqual([]);
  });

  it('uses a mended text for every cell that read the same, and takes that back as one', () => {
    const all = [finding(2), finding(3), finding(4), finding(5, { found: 'FY-20' })];
    const alike = alikeFindings([...all, ...duplicates]).get(textKey(all[0])) ?? [];
    expect(alike.map(({ row }) => row)).toEqual([2, 3, 4]);
    expect(useForAllOffer(all[0], alike, noMending)).toBeUndefined();
    const first = withCell(withCell(noMending, all[2], '2001'), all[0], '2019');
    const offer = useForAllOffer(all[0], alike, first);
    expect(offer?.label).toBe('Use this for all 3 cells that read “FY-19”');
    if (offer === undefined) return;
    const after = afterAct(first, offer.act);
    expect(after.cells.map(({ row, text }) => [row, text])).toEqual([
      [2, '2019'],
      [3, '2019'],
      [4, '2019'],
    ]);
    expect(useForAllOffer(all[1], alike, after)).toBeUndefined();
    const undone = beforeAct(after, offer.act);
    expect(new Set(undone.cells)).toEqual(new Set(first.cells));
  });

  it('takes no two lines that stand twice for cells that read the same', () => {
    expect(alikeFindings(duplicates).size).toBe(0);
  });
});
