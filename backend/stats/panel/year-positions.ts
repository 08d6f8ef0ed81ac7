/** The different years, ascending. */
export function yearsOf(year: Int32Array): number[] {
  const years = new Set<number>();
  for (let row = 0; row < year.length; row += 1) years.add(year[row]);
  return [...years].sort((left, right) => left - right);
}

/** Position of each row's year among the different years; mostly it is the one after that of the row before. */
export function positionsOf(year: Int32Array, years: readonly number[]): Int32Array {
  const places = new Map(years.map((value, position) => [value, position]));
  const positions = new Int32Array(year.length);
  let position = 0;
  for (let row = 0; row < year.length; row += 1) {
    position = years[position + 1] === year[row] ? position + 1 : (places.get(year[row]) ?? 0);
    positions[row] = position;
  }
  return positions;
}
