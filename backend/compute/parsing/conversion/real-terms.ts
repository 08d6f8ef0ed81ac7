import type { Conversion } from '../../file-recipe';
import type { MoneyColumn } from './money-columns';

/** Years whose money has no price index, each with the first placed row that it stands in. */
export type LackingIndices = ReadonlyMap<number, number>;

/**
 * Brings money to the prices of the base year, in place: money of year t times index(base) / index(t). Money becomes NaN
 * where its year or the base year has no index. Of two values for one year the later counts.
 *
 * @param values  values[column][placed row].
 */
export function toRealTerms(
  values: readonly Float64Array[],
  columns: readonly MoneyColumn[],
  year: Int32Array,
  { baseYear, index }: NonNullable<Conversion['prices']>,
): LackingIndices {
  const valueOf = new Map(index.map((entry) => [entry.year, entry.value]));
  const base = valueOf.get(baseYear) ?? NaN;
  const factors = new Map<number, number>();
  for (const ofRow of new Set(year)) factors.set(ofRow, base / (valueOf.get(ofRow) ?? NaN));
  const lacking = new Map<number, number>();
  columns.forEach(({ measure }, k) => {
    if (measure === 'no-money') return;
    const column = values[k];
    for (let row = 0; row < column.length; row++) {
      if (Number.isNaN(column[row])) continue;
      const factor = factors.get(year[row]) ?? NaN;
      if (Number.isNaN(factor)) {
        const lackingYear = Number.isNaN(base) ? baseYear : year[row];
        lacking.set(lackingYear, Math.min(lacking.get(lackingYear) ?? row, row));
      }
      column[row] *= factor;
    }
  });
  return lacking;
}
