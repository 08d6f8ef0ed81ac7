import { countSeats, seatOf } from './count-seats';
import type { BoughtSeats } from './plan';

const price = { amount: 8_900, currency: 'EUR' };

function bought(analyst: number, reading: number): readonly BoughtSeats[] {
  return [
    { kind: 'analyst', quantity: analyst, unitPrice: price },
    { kind: 'reading', quantity: reading, unitPrice: null },
  ];
}

function holders(...roles: readonly (readonly string[])[]) {
  return roles.map((held) => ({ roles: held }));
}

describe('counting seats', () => {
  it('gives an analyst one analyst seat, whatever other roles they hold', () => {
    expect(seatOf(['analyst'])).toBe('analyst');
    expect(seatOf(['cfo', 'analyst', 'reader', 'billing_admin'])).toBe('analyst');
  });

  it('gives a CFO and a reader one reading seat, and a billing admin alone none', () => {
    expect(seatOf(['cfo', 'reader'])).toBe('reading');
    expect(seatOf(['billing_admin', 'reader'])).toBe('reading');
    expect(seatOf(['billing_admin'])).toBeUndefined();
  });

  it('leaves free what neither members nor invitations take', () => {
    const members = holders(['analyst', 'billing_admin'], ['cfo'], ['reader'], ['billing_admin']);
    const invited = holders(['analyst'], ['reader'], ['billing_admin']);
    expect(countSeats(bought(3, 5), members, invited)).toEqual([
      { kind: 'analyst', bought: 3, used: 1, invited: 1, free: 1, unitPrice: price },
      { kind: 'reading', bought: 5, used: 2, invited: 1, free: 2, unitPrice: null },
    ]);
  });

  it('never counts a negative number of free seats', () => {
    const [analyst] = countSeats(bought(1, 0), holders(['analyst'], ['analyst']), []);
    expect(analyst).toEqual(jasmine.objectContaining({ bought: 1, used: 2, free: 0 }));
  });

  it('shows a kind that the subscription does not hold as none bought', () => {
    const [, reading] = countSeats(bought(1, 0).slice(0, 1), holders(['cfo']), []);
    expect(reading).toEqual({
      kind: 'reading',
      bought: 0,
      used: 1,
      invited: 0,
      free: 0,
      unitPrice: null,
    });
  });
});
