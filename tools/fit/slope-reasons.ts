import { reasonsOf } from './with-reasons';

interface Slope {
  readonly degreesOfFreedom: number | null;
  readonly low: number | null;
  readonly high: number | null;
  readonly unbounded?: 'low' | 'high' | 'both';
  readonly intervalReason?: string;
  readonly reason?: string;
}

const open = 'The bootstrap rules out no value on this side.';

/** Why a slope has no degrees of freedom, or an interval with an open end, where nothing else says it. */
export function slopeReasons(slope: Slope): Readonly<Record<string, string>> {
  const { unbounded } = slope;
  const isOpen = (side: 'low' | 'high'): boolean => unbounded === side || unbounded === 'both';
  const stated = slope.intervalReason ?? slope.reason;
  return reasonsOf(slope, {
    degreesOfFreedom: stated ?? 'A bootstrap has none.',
    low: isOpen('low') ? open : undefined,
    high: isOpen('high') ? open : undefined,
  });
}
