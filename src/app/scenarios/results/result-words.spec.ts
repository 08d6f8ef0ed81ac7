import { TestBed } from '@angular/core/testing';
import { NumberFormat } from '../../ui/number-format';
import { differenceWords, expectedWords, familiarRemark, noBandWords } from './result-words';

describe('words of results', () => {
  it('name a mean, or where the gap is carried a median, in logs alone', () => {
    expect(expectedWords('levels', { start: 'carry-the-gap' })).toBe('expected value');
    expect(expectedWords('log', { start: 'model-level' })).toBe('expected value, mean');
    expect(expectedWords('log', { start: 'carry-the-gap' })).toBe('expected value, median');
  });

  it('write a difference with its sign, of logs as a share', () => {
    const numbers = TestBed.inject(NumberFormat);
    numbers.unit.set('units');
    const value = { estimate: 285, low: 100, high: 470 };
    expect(differenceWords(value, 'levels', numbers)).toBe('+285 (100 to 470)');
    const logs = { estimate: Math.log(1.1), low: 0, high: Math.log(1.2) };
    expect(differenceWords(logs, 'log', numbers)).toBe('+10.0 % (0.0 to 20.0 %)');
  });

  it('say once why years have no band, and which years', () => {
    const none = (year: number, bandReason: string) => ({
      year,
      band: { confidence: 0.8, low: null, high: null, bandReason },
    });
    const outlook = { bandConfidence: 0.8 };
    expect(noBandWords([none(2026, 'Too few rows.'), none(2027, 'Too few rows.')], outlook)).toBe(
      'No 80 % band of the market value: Too few rows.',
    );
    const some = { confidence: 0.8, low: 1, high: 2, standardError: 1, degreesOfFreedom: 3 };
    expect(noBandWords([{ year: 2026, band: some }, none(2027, 'Beyond')], outlook)).toBe(
      'No 80 % band of the market value in FY2027: Beyond.',
    );
    expect(noBandWords([{ year: 2026, band: some }], outlook)).toBe('');
  });

  it('say nothing of a plan that is inside', () => {
    expect(familiarRemark('inside')).toBe('');
    expect(familiarRemark('edge')).toBe('at the edge of the familiar range');
  });
});
