import { coverageText } from './share-text';
import { addTallies, coverageOf, judge, judgeInterval, type Tallies } from './tally';

describe('Tallies of the coverage report', () => {
  it('gives the share held, its binomial standard error and the mean length', () => {
    const tallies = counted(190, 10);
    const coverage = coverageOf(tallies, 'standing');
    expect(coverage?.share).toBe(0.95);
    // √(.95 · .05 / 200) by hand
    expect(coverage?.standardError).toBeCloseTo(0.015411, 6);
    expect(coverage?.meanLength).toBe(2);
    expect(coverageText(coverage)).toBe('.950 ±.015');
  });

  it('adds stretches of replications to what one stretch would have counted', () => {
    const total = counted(120, 3);
    addTallies(total, counted(70, 7));
    expect(total).toEqual(counted(190, 10));
  });

  it('counts ends as inside, and leaves out an interval that is not given', () => {
    const tallies: Tallies = new Map();
    judgeInterval(tallies, 'drift', { low: 0, high: 1 }, 0);
    judgeInterval(tallies, 'drift', { low: null, high: null }, 0);
    judgeInterval(tallies, 'drift', { low: 1, high: 2 }, 0);
    expect(coverageOf(tallies, 'drift')).toEqual(
      jasmine.objectContaining({ given: 2, share: 0.5, meanLength: 1 }),
    );
  });

  it('shows a dash for what is never given, and counts measures without ends', () => {
    const tallies: Tallies = new Map();
    judge(tallies, 'rank set', true);
    expect(coverageText(coverageOf(tallies, 'rank set'))).toBe('1.000 ±.000');
    expect(coverageText(coverageOf(tallies, 'drift'))).toBe('–');
  });
});

function counted(inside: number, outside: number): Tallies {
  const tallies: Tallies = new Map();
  for (let index = 0; index < inside + outside; index += 1) {
    judgeInterval(tallies, 'standing', { low: -1, high: 1 }, index < inside ? 0.5 : 1.5);
  }
  return tallies;
}
