import type { SeatsReply } from '@contract';
import { missingSeats, seatTotals, seatsHeadline } from './seats-headline';

function seat(kind: 'analyst' | 'reading', bought: number, used: number, invited: number) {
  const free = Math.max(0, bought - used - invited);
  return { kind, bought, used, invited, free, unitPrice: null, interval: 'month' } as const;
}

describe('the finding of the Seats page', () => {
  it('says what is used, held by invitations and free', () => {
    const seats: SeatsReply['seats'] = [seat('analyst', 3, 1, 1), seat('reading', 5, 2, 0)];
    expect(seatsHeadline(seats)).toBe(
      '3 of 8 seats are used, 1 is held by an invitation, 4 are free',
    );
    expect(seatTotals(seats)).toEqual({ bought: 8, used: 3, invited: 1, free: 4 });
    expect(missingSeats(seats)).toEqual([]);
  });

  it('leaves invitations out where there are none, and counts one in the singular', () => {
    expect(seatsHeadline([seat('analyst', 1, 1, 0)])).toBe('1 of 1 seat is used, none is free');
    expect(seatsHeadline([seat('analyst', 4, 1, 2)])).toBe(
      '1 of 4 seats is used, 2 are held by invitations, 1 is free',
    );
  });

  it('names the kind that lacks seats although the other has some left', () => {
    const seats = [seat('analyst', 2, 2, 1), seat('reading', 5, 0, 0)];
    expect(missingSeats(seats)).toEqual(['1 more analyst seat is taken than bought.']);
  });
});
