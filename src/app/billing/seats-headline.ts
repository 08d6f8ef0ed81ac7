import type { SeatsReply } from '@contract';

type Seat = SeatsReply['seats'][number];

export interface SeatTotals {
  readonly bought: number;
  readonly used: number;
  readonly invited: number;
  readonly free: number;
}

/** Sums over the kinds; free seats of one kind do not make up for missing ones of another. */
export function seatTotals(seats: readonly Seat[]): SeatTotals {
  const sum = (of: keyof SeatTotals): number => seats.reduce((total, seat) => total + seat[of], 0);
  return { bought: sum('bought'), used: sum('used'), invited: sum('invited'), free: sum('free') };
}

/** The page's finding: `3 of 8 seats are used, 1 is held by an invitation, 4 are free`. */
export function seatsHeadline(seats: readonly Seat[]): string {
  const { bought, used, invited, free } = seatTotals(seats);
  const parts = [`${used} of ${bought} ${bought === 1 ? 'seat' : 'seats'} ${be(used)} used`];
  if (invited > 0)
    parts.push(
      `${invited} ${be(invited)} held by ${invited === 1 ? 'an invitation' : 'invitations'}`,
    );
  parts.push(free === 0 ? 'none is free' : `${free} ${be(free)} free`);
  return parts.join(', ');
}

/** Kinds of which more are taken than bought, each in words; empty when the seats suffice. */
export function missingSeats(seats: readonly Seat[]): readonly string[] {
  return seats.flatMap(({ kind, bought, used, invited }) => {
    const missing = used + invited - bought;
    if (missing <= 0) return [];
    return [
      `${missing} more ${kind} ${missing === 1 ? 'seat is' : 'seats are'} taken than bought.`,
    ];
  });
}

function be(count: number): string {
  return count === 1 ? 'is' : 'are';
}
