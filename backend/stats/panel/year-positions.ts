/** Years within this span of each other are marked in a table, which is quicker than a set. */
const widestTable = 10_000;

/** The different years, ascending. */
export function yearsOf(year: Int32Array): number[] {
  let first = Infinity;
  let last = -Infinity;
  for (let row = 0; row < year.length; row += 1) {
    if (year[row] < first) first = year[row];
    if (year[row] > last) last = year[row];
  }
  if (last - first > widestTable) return [...new Set(year)].sort((left, right) => left - right);
  const isPresent = new Uint8Array(Math.max(0, last - first + 1));
  for (let row = 0; row < year.length; row += 1) isPresent[year[row] - first] = 1;
  const years: number[] = [];
  isPresent.forEach((value, index) => {
    if (value === 1) years.push(first + index);
  });
  return years;
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
