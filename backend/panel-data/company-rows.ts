import type { PanelCells } from './panel-cells';

/** Row numbers of each company in order of year; one array a company, in the order of `companies`. */
export function rowsByCompany({ companies, company, year }: PanelCells): readonly Int32Array[] {
  const counts = new Int32Array(companies.length);
  for (let row = 0; row < company.length; row++) counts[company[row]] += 1;
  const lists = Array.from(counts, (count) => new Int32Array(count));
  counts.fill(0);
  for (let row = 0; row < company.length; row++) {
    const code = company[row];
    lists[code][counts[code]] = row;
    counts[code] += 1;
  }
  return lists.map((rows) => rows.sort((left, right) => year[left] - year[right]));
}
