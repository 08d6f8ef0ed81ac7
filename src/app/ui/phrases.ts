/** `1 company`, `12 companies`, `1,200 rows`. */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${count.toLocaleString('en')} ${count === 1 ? one : many}`;
}

/** `FY2008–FY2025`, or `FY2008` for one year. */
export function yearsText(firstYear: number, lastYear: number): string {
  return firstYear === lastYear ? `FY${firstYear}` : `FY${firstYear}–FY${lastYear}`;
}

/** Where a row of the panel comes from: the line of the imported file; `added` for 0, a row that a correction added. */
export function lineText(fileRow: number): string {
  return fileRow === 0 ? 'added' : String(fileRow);
}

/** What a link to a row of the panel says: `Velmara FY2024, row 17 in the panel`. */
export function rowLinkText(row: {
  readonly company: string;
  readonly year: number;
  readonly fileRow: number;
}): string {
  const line = row.fileRow === 0 ? 'added row' : `row ${row.fileRow}`;
  return `${row.company} ${yearsText(row.year, row.year)}, ${line} in the panel`;
}

/** The first characters of a hash, for the eye. */
export function shortHash(hash: string | null): string {
  return hash === null ? 'n/a' : hash.slice(0, 6);
}

/** `capex, book equity and staff`. */
export function listed(words: readonly string[], conjunction: 'and' | 'or' = 'and'): string {
  return words.length < 2
    ? words.join('')
    : `${words.slice(0, -1).join(', ')} ${conjunction} ${words[words.length - 1]}`;
}

/** With its full stop, once. */
export function sentence(text: string): string {
  return text.endsWith('.') ? text : `${text}.`;
}

/** What is said of regressors that the model reads a year late. */
export function lagText(lag: 0 | 1 | undefined): string {
  return lag === 1 ? ' of the year before' : '';
}

/** `95 %`. */
export function confidenceText(confidence: number): string {
  return `${Number((confidence * 100).toPrecision(4))} %`;
}
