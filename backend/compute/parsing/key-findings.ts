import type { TableMapping } from './column-indices';
import type { TableFinding } from './table-finding';

interface Keys {
  readonly companies: readonly string[];
  readonly company: Int32Array;
  readonly year: Int32Array;
  readonly fileRow: Int32Array;
}

/** Every row whose company and year another row has too. */
export function duplicateFindings(keys: Keys, mapping: TableMapping): TableFinding[] {
  const rowsOf = new Map<string, number[]>();
  keys.year.forEach((year, index) => {
    const key = `${keys.company[index]}:${year}`;
    const rows = rowsOf.get(key);
    if (rows === undefined) rowsOf.set(key, [index]);
    else rows.push(index);
  });
  return [...rowsOf.values()]
    .filter((rows) => rows.length > 1)
    .flatMap((rows) =>
      rows.map((index): TableFinding => {
        const others = rows.filter((other) => other !== index).map((other) => keys.fileRow[other]);
        const company = keys.companies[keys.company[index]];
        return {
          row: keys.fileRow[index],
          column: mapping.year,
          found: String(keys.year[index]),
          code: 'duplicate',
          detail: `${company} ${keys.year[index]} also stands on line ${others.join(', ')}.`,
          isBlocking: true,
        };
      }),
    );
}

/** The first row of each further spelling of a name that differs only by case or blanks. */
export function spellingFindings(keys: Keys, mapping: TableMapping): TableFinding[] {
  const first = new Map<string, number>();
  return keys.companies.flatMap((name, code): TableFinding[] => {
    const key = name.toLowerCase().replace(/\s+/gu, '');
    const other = first.get(key);
    if (other === undefined) {
      first.set(key, code);
      return [];
    }
    const detail = `Differs from “${keys.companies[other]}” only by case or blanks; both count as companies of their own.`;
    return [
      {
        row: keys.fileRow[keys.company.indexOf(code)],
        column: mapping.company,
        found: name,
        code: 'spelling',
        detail,
        isBlocking: false,
      },
    ];
  });
}
