import { TestBed } from '@angular/core/testing';
import {
  asDifference,
  asShownGaps,
  differenceKind,
  differenceUnit,
  levelKind,
  levelUnit,
  modelNotes,
} from './model-form';
import { NumberFormat } from './number-format';
import { PageContext } from './page-context';

describe('what the form of a model makes of its figures', () => {
  it('shows a difference of logs as the share exp(d) − 1, ends too, and money as it is', () => {
    const inLogs = { estimate: Math.log(1.34), low: Math.log(1.12), high: Math.log(1.6) };
    const shown = asDifference(inLogs, 'log');
    expect(shown.estimate).toBeCloseTo(0.34, 12);
    expect(shown.low).toBeCloseTo(0.12, 12);
    expect(shown.high).toBeCloseTo(0.6, 12);
    expect(asDifference(inLogs, 'levels')).toBe(inLogs);
    expect(asDifference(inLogs, undefined)).toBe(inLogs);
  });

  it('keeps a missing end missing, with its reason', () => {
    const open = { estimate: 0, low: null, high: null, intervalReason: 'perfect fit' };
    expect(asDifference(open, 'log')).toEqual(open);
  });

  it('gives no share that is beyond what a percentage can say, and says why', () => {
    const [inside, beyond] = [34.5, 34.6];
    const reason = 'Out of logs this interval leaves what a percentage can say.';
    const open = { low: null, high: null, intervalReason: reason };
    expect(asDifference({ estimate: 0, low: -1, high: beyond }, 'log')).toEqual({
      estimate: 0,
      ...open,
    });
    expect(asDifference({ estimate: inside, low: beyond, high: 36 }, 'log')).toEqual({
      estimate: Math.expm1(inside),
      ...open,
    });
    expect(asDifference({ estimate: 0, low: -1, high: inside }, 'log').high).toBe(
      Math.expm1(inside),
    );
    expect(Number.isFinite(asDifference({ estimate: 800, low: 1, high: 2 }, 'log').estimate))
      .withContext('an estimate that a number cannot hold')
      .toBeTrue();
  });

  it('keeps the reason that an interval had before it went beyond', () => {
    const half = { estimate: 0, low: null, high: 40, intervalReason: 'one end alone' };
    expect(asDifference(half, 'log')).toEqual({ ...half, high: null });
  });

  it('leaves a year out of a gap path whose gap is beyond', () => {
    const years: { year: number; gap: number | null }[] = [{ year: 2020, gap: 40 }];
    expect(asShownGaps(years, 'log')).toEqual([{ year: 2020, gap: null }]);
    expect(asShownGaps(years, 'levels')).toBe(years);
  });

  it('leaves years without a gap without one', () => {
    const years = [
      { year: 2020, gap: null, peers: 0 },
      { year: 2021, gap: Math.log(2), peers: 3 },
    ];
    const shown = asShownGaps(years, 'log') ?? [];
    expect(shown[0].gap).toBeNull();
    expect(shown[1].gap).toBeCloseTo(1, 12);
    expect(asShownGaps(years, 'levels')).toBe(years);
    expect(asShownGaps(null, 'log')).toBeNull();
  });

  it('puts no figure of logs under a unit of money', () => {
    TestBed.inject(PageContext).show({ currency: 'EUR', unit: 'millions' });
    const numbers = TestBed.inject(NumberFormat);
    expect([levelKind('log'), differenceKind('log')]).toEqual(['plain', 'percent']);
    expect([levelUnit('log', numbers), differenceUnit('log', numbers)]).toEqual([
      'natural logs',
      'percent',
    ]);
    expect([levelKind('levels'), differenceKind(undefined)]).toEqual(['money', 'money']);
    expect([levelUnit('levels', numbers), differenceUnit(undefined, numbers)]).toEqual([
      'EUR m',
      'EUR m',
    ]);
  });

  it('names what of a model is not the plain one', () => {
    expect(modelNotes({ effects: 'company', form: 'levels' })).toEqual([]);
    expect(modelNotes({ effects: 'company,year', form: 'log' })).toEqual([
      'in logs',
      'year effects taken out',
    ]);
  });
});
