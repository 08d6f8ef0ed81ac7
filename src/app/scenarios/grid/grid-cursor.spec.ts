import { blockBetween, isInBlock, movedPlace } from './grid-cursor';

describe('the cursor of the grid', () => {
  const size = { rows: 3, columns: 2 };
  const at = { row: 1, column: 1 };
  const by = (key: string, ctrlKey = false) => movedPlace({ key, ctrlKey }, at, size);

  it('moves by arrows and stops at the edges', () => {
    expect(by('ArrowUp')).toEqual({ row: 0, column: 1 });
    expect(by('ArrowDown')).toEqual({ row: 2, column: 1 });
    expect(by('ArrowLeft')).toEqual({ row: 1, column: 0 });
    expect(by('ArrowRight')).toEqual(at);
  });

  it('goes to the ends of the row, and with Ctrl of the grid', () => {
    expect(by('Home')).toEqual({ row: 1, column: 0 });
    expect(by('End')).toEqual({ row: 1, column: 1 });
    expect(by('Home', true)).toEqual({ row: 0, column: 0 });
    expect(by('End', true)).toEqual({ row: 2, column: 1 });
    expect(by('a')).toBeUndefined();
  });

  it('spans a block whichever corner came first', () => {
    const block = blockBetween({ row: 2, column: 0 }, { row: 0, column: 1 });
    expect(block).toEqual({ from: { row: 0, column: 0 }, to: { row: 2, column: 1 } });
    expect(isInBlock(block, { row: 1, column: 1 })).toBeTrue();
    expect(isInBlock(block, { row: 3, column: 1 })).toBeFalse();
  });
});
