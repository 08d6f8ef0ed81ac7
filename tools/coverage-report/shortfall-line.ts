import type { Shortfall } from './shortfalls';
import { sharePoints } from './share-text';

/** One interval below the lowest share, in words. */
export function shortfallLine({ setting, measure, coverage, broken }: Shortfall): string {
  const found = `${setting.name}: ${measure} ${sharePoints(coverage.share)} (s.e. ${sharePoints(coverage.standardError)})`;
  return broken.length === 0
    ? `${found}, not promised`
    : `${found}, promised: ${broken.map(({ name }) => name).join(', ')}`;
}
