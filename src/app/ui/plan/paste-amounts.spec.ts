import { type PasteGround, pastedAmounts } from './paste-amounts';

const ground: PasteGround = {
  firstYear: 2026,
  regressors: 2,
  isAboveZero: false,
  toPanel: (shown, regressor) => (regressor === 0 ? shown * 1000 : shown),
};
const start = { year: 2026, regressor: 0 };

describe('pasted amounts', () => {
  it('come in as people write them, in the panel’s unit', () => {
    const { amounts, bad } = pastedAmounts('(1,234)\t1 000\n12\t50%\n', start, ground);
    expect(amounts).toEqual([
      { year: 2026, regressor: 0, value: -1_234_000 },
      { year: 2026, regressor: 1, value: 1000 },
      { year: 2027, regressor: 0, value: 12_000 },
      { year: 2027, regressor: 1, value: 0.5 },
    ]);
    expect(bad).toEqual([]);
  });

  it('read a decimal comma where the block proves one', () => {
    const { amounts } = pastedAmounts('1.234,56\t2.000', start, ground);
    expect(amounts.map(({ value }) => value)).toEqual([1_234_560, 2000]);
  });

  it('mark cells that are no amount, each with its reason, and take the others', () => {
    const { amounts, bad } = pastedAmounts('5\tlots\n–\t7', start, ground);
    expect(amounts.map(({ value }) => value)).toEqual([5000, 7]);
    expect(bad).toEqual([
      { year: 2026, regressor: 1, text: 'lots', reason: 'expected a number' },
      { year: 2027, regressor: 0, text: '–', reason: 'a plan needs an amount' },
    ]);
    const logs = pastedAmounts('0\t7', start, { ...ground, isAboveZero: true });
    expect(logs.bad.map(({ reason }) => reason)).toEqual([
      'expected an amount above zero, for the fit reads logs',
    ]);
  });

  it('turn a block that has its years across', () => {
    const { amounts, isTurned } = pastedAmounts('1\t2\t3\n4\t5\t6', start, ground);
    expect(isTurned).toBeTrue();
    expect(amounts.map(({ year, regressor }) => [year, regressor])).toEqual([
      [2026, 0],
      [2026, 1],
      [2027, 0],
      [2027, 1],
      [2028, 0],
      [2028, 1],
    ]);
    expect(amounts.map(({ value }) => value)).toEqual([1000, 4, 2000, 5, 3000, 6]);
  });

  it('say how many cells a plan has no room for', () => {
    const { amounts, leftOut } = pastedAmounts('1\n2\n3', { year: 2029, regressor: 1 }, ground);
    expect(amounts.map(({ year }) => year)).toEqual([2029, 2030]);
    expect(leftOut).toBe(1);
  });
});
