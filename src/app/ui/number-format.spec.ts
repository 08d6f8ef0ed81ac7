import { TestBed } from '@angular/core/testing';
import { NumberFormat } from './number-format';

describe('NumberFormat', () => {
  function panelInMillions(): NumberFormat {
    const numbers = TestBed.inject(NumberFormat);
    numbers.currency.set('EUR');
    numbers.panelUnit.set('millions');
    return numbers;
  }

  it('converts money from the panel’s unit to the one the person wants', () => {
    const numbers = panelInMillions();
    expect(numbers.figure(2407.09)).toBe('2,407');
    numbers.unit.set('thousands');
    expect(numbers.unitLabel()).toBe('EUR k');
    expect(numbers.figure(2407.09)).toBe('2,407,090');
    numbers.unit.set('billions');
    expect(numbers.figure(2407.09)).toBe('2.407');
    expect(numbers.toPanelUnit(2.407)).toBeCloseTo(2407, 9);
  });

  it('leaves slopes and shares alone when the unit changes', () => {
    const numbers = panelInMillions();
    numbers.unit.set('units');
    expect(numbers.figure(2.8561, 'plain')).toBe('2.856');
    expect(numbers.figure(0.623, 'percent')).toBe('62.3 %');
    expect(numbers.figure(243, 'count')).toBe('243');
  });

  it('writes tables at four significant digits and headlines at three', () => {
    const numbers = panelInMillions();
    const standing = { estimate: 2407.1, low: 1275.2, high: 3539.4 };
    expect(numbers.interval(standing)).toBe('2,407 (1,275 to 3,539)');
    expect(numbers.interval(standing, 'money', 3)).toBe('2,410 (1,280 to 3,540)');
    expect(numbers.headline(2407.1)).toBe('2,410');
    expect(numbers.figure(12345.6)).toBe('12,346');
  });

  it('writes negatives in the person’s style in columns, and with a minus sign in prose', () => {
    const numbers = panelInMillions();
    numbers.negatives.set('parentheses');
    expect(numbers.figure(-600)).toBe('(600.0)');
    expect(numbers.figure(-600, 'money', 0)).toBe('(600)');
    expect(numbers.interval({ estimate: -600, low: -1000, high: -200 }, 'money', 3)).toBe(
      '\u2212600 (\u22121,000 to \u2212200)',
    );
  });

  it('marks a share and both its bounds as percent, and never by the unit of money', () => {
    const numbers = panelInMillions();
    numbers.unit.set('billions');
    const share = { estimate: 0.3418, low: 0.1196, high: 0.6032 };
    expect(numbers.interval(share, 'percent', 3)).toBe('34.2 % (12.0 to 60.3 %)');
    expect(numbers.interval({ ...share, low: null }, 'percent')).toBe('34.2 % (no interval)');
    expect(numbers.bounds({ ...share, low: -0.05 }, 'percent')).toBe('\u22125.0 to 60.3 %');
    expect(numbers.interval({ estimate: 0.0012, low: 0, high: 0.0024 }, 'percent', 3)).toBe(
      '0.1 % (0.0 to 0.2 %)',
    );
  });

  it('says at which end an interval is open', () => {
    const numbers = panelInMillions();
    const slope = { estimate: 2, low: 0.92, high: null, unbounded: 'high' as const };
    expect(numbers.bounds(slope, 'plain')).toBe('0.920 and up');
    expect(numbers.interval(slope, 'plain', 3)).toBe('2.00 (0.92 and up)');
    expect(numbers.bounds({ estimate: 2, low: null, high: 3, unbounded: 'low' }, 'plain', 2)).toBe(
      '3.00 and down',
    );
    expect(numbers.bounds({ estimate: 2, low: null, high: null, unbounded: 'both' }, 'plain')).toBe(
      'no interval',
    );
  });

  it('tells zero from missing', () => {
    const numbers = panelInMillions();
    expect(numbers.figure(0)).toBe('–');
    expect(numbers.figure(null)).toBe('n/a');
    expect(numbers.bounds({ estimate: 1, low: null, high: null })).toBe('no interval');
  });
});
