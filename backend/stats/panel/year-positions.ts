/** Years within this span of each other are marked in a table, which is quicker than a set. */
const widestTable = 10_000;

/** The different years of a sample, and where each row's stands among them. */
export interface YearPositions {
  /** Ascending. */
  readonly years: readonly number[];
  /** One a row, 0 … years − 1. */
  readonly position: Int32Array;
}

/** @param starts  company i holds rows starts[i] … starts[i + 1] − 1, years ascending. */
export function yearPositions(year: Int32Array, starts: Int32Array): YearPositions {
  let first = Infinity;
  let last = -Infinity;
  for (let company = 1; company < starts.length; company += 1) {
    first = Math.min(first, year[starts[company - 1]]);
    last = Math.max(last, year[starts[company] - 1]);
  }
  return last - first > widestTable ? sortedPositions(year) : tabledPositions(year, first, last);
}

function tabledPositions(year: Int32Array, first: number, last: number): YearPositions {
  const table = new Int32Array(last - first + 1);
  for (let row = 0; row < year.length; row += 1) table[year[row] - first] = 1;
  const years: number[] = [];
  table.forEach((isPresent, index) => {
    if (isPresent === 0) return;
    table[index] = years.length;
    years.push(first + index);
  });
  const position = new Int32Array(year.length);
  for (let row = 0; row < year.length; row += 1) position[row] = table[year[row] - first];
  return { years, position };
}

function sortedPositions(year: Int32Array): YearPositions {
  const years = [...new Set(year)].sort((left, right) => left - right);
  const places = new Map(years.map((value, position) => [value, position]));
  return { years, position: year.map((value) => places.get(value) ?? 0) };
}
