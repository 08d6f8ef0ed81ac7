/** Rows of a statement: large enough to be quick, small enough that other requests are answered between two of them. */
export const batchRows = 5000;

export function* batchesOf<T>(rows: readonly T[]): Generator<readonly T[]> {
  for (let start = 0; start < rows.length; start += batchRows)
    yield rows.slice(start, start + batchRows);
}
