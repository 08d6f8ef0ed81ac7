import type { BoughtSeats, Money, SeatKind } from './plan';
import { seatKinds } from './plan';

/** Seats of one kind: paid for, taken by members, held for invitations, left. */
export interface SeatCount {
  readonly kind: SeatKind;
  readonly bought: number;
  readonly used: number;
  readonly invited: number;
  /** Never negative: where more are in use than bought, none is free. */
  readonly free: number;
  readonly unitPrice: Money | null;
}

interface Holder {
  readonly roles: readonly string[];
}

/** The seat that a set of roles takes; undefined for a billing admin alone, who takes none. */
export function seatOf(roles: readonly string[]): SeatKind | undefined {
  if (roles.includes('analyst')) return 'analyst';
  return roles.includes('cfo') || roles.includes('reader') ? 'reading' : undefined;
}

/** @param invited  invitations that can still be accepted. */
export function countSeats(
  seats: readonly BoughtSeats[],
  members: readonly Holder[],
  invited: readonly Holder[],
): readonly SeatCount[] {
  return seatKinds.map((kind) => {
    const ofKind = seats.filter((seat) => seat.kind === kind);
    const taking = (holders: readonly Holder[]): number =>
      holders.filter((holder) => seatOf(holder.roles) === kind).length;
    const counts = {
      bought: ofKind.reduce((sum, seat) => sum + seat.quantity, 0),
      used: taking(members),
      invited: taking(invited),
    };
    return {
      kind,
      ...counts,
      free: Math.max(0, counts.bought - counts.used - counts.invited),
      unitPrice: ofKind[0]?.unitPrice ?? null,
    };
  });
}
