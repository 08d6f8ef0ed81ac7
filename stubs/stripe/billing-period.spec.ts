import { periodAfter, periodFrom } from './billing-period';
import { prices } from './catalogue';

describe('billing periods', () => {
  const at = (text: string): number => Date.parse(`${text}T12:00:00Z`) / 1000;
  const [monthly, yearly] = prices;

  it('clamps to the end of a short month and comes back to the anchor day', () => {
    const anchor = at('2026-01-31');
    expect(periodFrom(anchor, monthly, 0).end).toBe(at('2026-02-28'));
    expect(periodFrom(anchor, monthly, 1)).toEqual({
      start: at('2026-02-28'),
      end: at('2026-03-31'),
    });
  });

  it('steps over a year end and through leap days', () => {
    expect(periodFrom(at('2026-12-15'), monthly, 0).end).toBe(at('2027-01-15'));
    expect(periodFrom(at('2028-02-29'), yearly, 0).end).toBe(at('2029-02-28'));
    expect(periodFrom(at('2028-02-29'), yearly, 3).end).toBe(at('2032-02-29'));
  });

  it('finds the period that follows a given end', () => {
    const anchor = at('2026-01-31');
    expect(periodAfter(anchor, monthly, anchor).start).toBe(anchor);
    expect(periodAfter(anchor, monthly, at('2026-04-30')).end).toBe(at('2026-05-31'));
  });
});
