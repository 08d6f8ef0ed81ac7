import { inSlices } from './in-slices';

describe('work in slices', () => {
  it('reaches every item once, in order, with its index', async () => {
    const items = Array.from({ length: 5001 }, (_, index) => `item ${index}`);
    const seen: string[] = [];
    await inSlices(items, (item, index) => {
      expect(index).toBe(seen.length);
      seen.push(item);
    });
    expect(seen).toEqual(items);
    await inSlices([], fail);
  });

  it('lets others of the process have their turn in between', async () => {
    let turns = 0;
    const count = (): void => {
      turns += 1;
      next = setImmediate(count);
    };
    let next = setImmediate(count);
    await inSlices(new Array<number>(10_000).fill(1), () => undefined);
    clearImmediate(next);
    expect(turns).toBeGreaterThanOrEqual(4);
  });

  it('ends with the first error of the work', async () => {
    const failing = inSlices([1, 2, 3], (item) => {
      if (item === 2) throw new Error('no two');
      expect(item).toBe(1);
    });
    await expectAsync(failing).toBeRejectedWithError('no two');
  });
});
