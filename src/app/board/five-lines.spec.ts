import { TestBed } from '@angular/core/testing';
import type { EditionContent } from '@contract';
import { NumberFormat } from '../ui/number-format';
import { fiveLines } from './five-lines';
import { editionContent, logEditionContent } from './testing/edition-content';

describe('an edition in five lines', () => {
  let numbers: NumberFormat;
  const withFit = (fit: Partial<EditionContent['fit']>): EditionContent => ({
    ...editionContent,
    fit: { ...editionContent.fit, ...fit },
  });
  const line = (content: EditionContent, index: number) => fiveLines(content, numbers)[index];

  beforeEach(() => {
    numbers = TestBed.inject(NumberFormat);
    numbers.panelUnit.set('millions');
    numbers.unit.set('millions');
  });

  it('says whether company levels differ', () => {
    expect(line(editionContent, 0).kind).toBe('fine');
    expect(line(editionContent, 0).text).toContain(
      'company effects are kept (F 115.9 on 2 and 31)',
    );
    const pooled = withFit({ poolability: { value: 1.1, df1: 2, df2: 31, pValue: 0.35 } });
    expect(line(pooled, 0).kind).toBe('caution');
    expect(line(pooled, 0).text).toContain('is not ruled out');
  });

  it('counts the peers that are shown to be lower and higher', () => {
    expect(line(editionContent, 1).text).toBe(
      'Place 1 to 2: 1 of 2 peers are shown to be lower, 0 higher, 1 cannot be told apart.',
    );
    expect(line(editionContent, 1).figure).toBe('rank-set');
  });

  it('names the company that decides the result, or how far the standing moves without each', () => {
    expect(line(editionContent, 2).text).toContain('stays between 1,670 and 2,120');
    const detail = 'Without Sarvane, capex goes from 2 to −1: this one company decides the result.';
    const dominated = withFit({ warnings: [{ code: 'dominated', detail }] });
    expect(line(dominated, 2)).toEqual({ kind: 'caution', text: detail });
  });

  it('says in which direction the gap drifts only where its interval leaves zero out', () => {
    expect(line(editionContent, 3).text).toContain('No drift');
    const falling = withFit({
      drift: { estimate: -30, standardError: 5, low: -45, high: -15, pValue: 0.01 },
    });
    expect(line(falling, 3).kind).toBe('caution');
    expect(line(falling, 3).text).toContain('falls by −30.0 (−45.0 to −15.0) a year');
    const short = withFit({ drift: null, driftReason: 'It has 6 rows' });
    expect(line(short, 3).text).toContain('It has 6 rows');
  });

  it('gives standing and drift of a fit in logs in percent', () => {
    expect(line(logEditionContent, 2).text).toContain('stays between 25.0 % and 40.0 %');
    expect(line(logEditionContent, 3).text).toContain('rises by 2.0 % (1.0 to 3.0 %) a year');
  });

  it('repeats where a plan leaves the familiar range, and how many peer groups were tried', () => {
    expect(line(editionContent, 4)).toEqual({
      kind: 'caution',
      text: 'Build-out: FY2027 is at the edge of the familiar range. 3 peer group versions were saved up to this edition.',
    });
    const without = { ...editionContent, scenarios: [], peerGroupsTried: 1 };
    expect(line(without, 4).text).toBe(
      'The edition holds no plan. No other peer group was saved before this one.',
    );
  });
});
