import type { ModelRole } from '../model-role';
import { medianAndSpread, outlierScore } from '../robust';
import type { FlaggedCell } from './flag';
import type { FlagGround } from './flag-ground';

/** Fewer companies than this say nothing about what is usual. Common practice, no source. */
const fewestPeers = 8;
/** Ratios vary by a fifth at least. Common practice, no source. */
const leastSpread = 0.2;

const measured: readonly ModelRole[] = ['marketValue', 'capex'];

/**
 * Market values and capital expenditure whose ratio to book equity lies far from the other companies' in the same year:
 * modified z over the logs of the ratios (Iglewicz & Hoaglin 1993).
 */
export function peerOutlierFlags(ground: FlagGround): FlaggedCell[] {
  const { panel, model } = ground;
  const base = model.bookEquity;
  if (base === undefined) return [];
  const byYear = new Map<number, number[]>();
  for (let row = 0; row < panel.year.length; row++) {
    const rows = byYear.get(panel.year[row]);
    if (rows === undefined) byYear.set(panel.year[row], [row]);
    else rows.push(row);
  }
  return measured.flatMap((role) => {
    const column = model[role];
    return column === undefined
      ? []
      : [...byYear.values()].flatMap((rows) => outliersAmong(ground, column, base, rows));
  });
}

function outliersAmong(
  { panel }: FlagGround,
  column: number,
  base: number,
  rows: readonly number[],
): FlaggedCell[] {
  const [cells, bases] = [panel.values[column], panel.values[base]];
  const shown = rows.filter((row) => cells[row] > 0 && bases[row] > 0);
  if (shown.length < fewestPeers) return [];
  const logs = shown.map((row) => Math.log(cells[row] / bases[row]));
  const usual = medianAndSpread(logs);
  const spread = Math.max(usual.spread, leastSpread);
  return shown.flatMap((row, place): FlaggedCell[] => {
    const score = (logs[place] - usual.median) / spread;
    if (Math.abs(score) <= outlierScore) return [];
    const ratios = { ratio: Math.exp(logs[place]), usualRatio: Math.exp(usual.median) };
    const peers = shown.length - 1;
    return [{ row, column, facts: { code: 'peer-outlier', ...ratios, score, peers } }];
  });
}
