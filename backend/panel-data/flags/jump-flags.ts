import { medianAndSpread, outlierScore } from '../robust';
import type { FlaggedCell } from './flag';
import type { FlagGround } from './flag-ground';
import { modelColumns } from './flag-ground';

/** Fewer changes than this say nothing about what is usual. Common practice, no source. */
const fewestChanges = 5;
/** A company that hardly moves is not flagged for moving a little: changes vary by a twentieth at least. Common practice, no source. */
const leastSpread = 0.05;
/** A change by less than half is no jump, however steady the rest. Common practice, no source. */
const leastChange = Math.log(1.5);

/**
 * Changes between consecutive years that lie far from the company's own: modified z over its log changes, by median and
 * median absolute deviation (Iglewicz & Hoaglin 1993).
 */
export function jumpFlags(ground: FlagGround): FlaggedCell[] {
  return modelColumns(ground).flatMap((column) =>
    ground.rowsOf.flatMap((rows) => jumpsOf(ground, column, rows)),
  );
}

function jumpsOf({ panel }: FlagGround, column: number, rows: Int32Array): FlaggedCell[] {
  const cells = panel.values[column];
  const changes: { readonly row: number; readonly before: number; readonly change: number }[] = [];
  for (let place = 1; place < rows.length; place++) {
    const [last, row] = [rows[place - 1], rows[place]];
    const before = cells[last];
    if (panel.year[row] - panel.year[last] === 1 && before > 0 && cells[row] > 0)
      changes.push({ row, before, change: Math.log(cells[row] / before) });
  }
  if (changes.length < fewestChanges) return [];
  const usual = medianAndSpread(changes.map(({ change }) => change));
  const spread = Math.max(usual.spread, leastSpread);
  return changes.flatMap(({ row, before, change }): FlaggedCell[] => {
    const score = (change - usual.median) / spread;
    if (Math.abs(score) <= outlierScore || Math.abs(change) < leastChange) return [];
    const ratios = { ratio: Math.exp(change), usualRatio: Math.exp(usual.median) };
    return [{ row, column, facts: { code: 'jump', before, ...ratios, score } }];
  });
}
