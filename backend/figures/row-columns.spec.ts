import { columnHeads, rowColumns, ticksBesideHeads, ticksFor } from './row-columns';

const columns = [
  { label: '', texts: ['2,100', '900'] },
  { label: 'change', texts: ['+1,200', '−30'] },
];

describe('row columns', () => {
  it('keeps names, marks and figures apart and inside the width', () => {
    const { nameX, left, right, columnX } = rowColumns(['Tolvane', 'Ostrell'], columns, 640);
    expect(nameX).toBeLessThan(left);
    expect(right - left).toBeGreaterThanOrEqual(220);
    expect(columnX[0]).toBeGreaterThan(right + 30);
    expect(columnX[1]).toBe(632);
    expect(columnX[1]! - columnX[0]!).toBeGreaterThan(43);
  });

  it('gives up the last column first, and in the end all', () => {
    const fits = (width: number) =>
      rowColumns(['Tolvane', 'Ostrell'], columns, width).columnX.map((x) => x !== null);
    expect(fits(640)).toEqual([true, true]);
    expect(fits(380)).toEqual([true, false]);
    expect(fits(320)).toEqual([false, false]);
  });

  it('gives long names a share of the width at most', () => {
    const { nameWidth } = rowColumns(['A'.repeat(80)], [], 400);
    expect(nameWidth).toBe(120);
  });

  it('writes only the heads that have a column and words', () => {
    const heads = columnHeads(columns, rowColumns(['Tolvane'], columns, 640), 14);
    expect(heads).toEqual([{ text: 'change', x: 632, y: 14, anchor: 'end' }]);
    expect(columnHeads(columns, rowColumns(['Tolvane'], columns, 320), 14)).toEqual([]);
  });

  it('drops the mark of an axis that would run into a head, and no other', () => {
    const tick = (position: number) => ({ value: position, position, label: '3,500' });
    const ticks = [tick(100), tick(560), tick(590)];
    const heads = columnHeads(columns, rowColumns(['Tolvane'], columns, 640), 14);
    expect(ticksBesideHeads(ticks, heads).map(({ position }) => position)).toEqual([100, 560]);
    expect(ticksBesideHeads(ticks, []).length).toBe(3);
  });

  it('has room for three marks at least', () => {
    expect(ticksFor({ left: 20, right: 60 })).toBe(3);
    expect(ticksFor({ left: 0, right: 770 })).toBe(7);
  });

  it('stands without names and columns', () => {
    const { left, right, columnX } = rowColumns([], [], 360);
    expect([left, right, columnX.length]).toEqual([20, 348, 0]);
  });
});
