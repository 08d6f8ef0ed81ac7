import type { Coverage } from './tally';

/** A share without its leading zero, as tables of coverage are read: .948. */
export function sharePoints(share: number): string {
  const text = share.toFixed(3);
  return text.startsWith('0') ? text.slice(1) : text;
}

/** Share and Monte Carlo standard error: .948 ±.003; a dash where no interval is given. */
export function coverageText(coverage: Coverage | null): string {
  if (coverage === null) return '–';
  return `${sharePoints(coverage.share)} ±${sharePoints(coverage.standardError)}`;
}
