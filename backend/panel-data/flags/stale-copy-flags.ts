import type { FlaggedCell } from './flag';
import type { FlagGround } from './flag-ground';
import { modelColumns } from './flag-ground';

/** A figure of fewer significant digits may well come twice. Common practice, no source. */
const fewestDigits = 3;

/** Figures that repeat the year before digit by digit: all of a row, or one of three digits and more. */
export function staleCopyFlags(ground: FlagGround): FlaggedCell[] {
  const { panel } = ground;
  const model = modelColumns(ground);
  return ground.rowsOf.flatMap((rows) =>
    [...rows].flatMap((row, place): FlaggedCell[] => {
      const last = rows[place - 1];
      if (place === 0 || panel.year[row] - panel.year[last] !== 1) return [];
      const same = model.filter((column) => {
        const cells = panel.values[column];
        return cells[row] === cells[last] && cells[row] !== 0;
      });
      const kept = same.filter(
        (column) => same.length > 1 || digitsOf(panel.values[column][row]) >= fewestDigits,
      );
      return kept.map((column) => ({
        row,
        column,
        facts: { code: 'stale-copy', columns: same.length },
      }));
    }),
  );
}

/** Significant digits of a number's shortest form, trailing zeros not counted. */
function digitsOf(value: number): number {
  const [mantissa] = Math.abs(value).toExponential().split('e');
  return mantissa.replace('.', '').length;
}
