import { type FieldError, Invalid } from '../errors/app-error';
import type { PanelMapping } from './import-draft';

/**
 * Every column that the mapping names must be a header of the table, and none may be two things of the panel.
 *
 * @throws {Invalid} with a pointer to each name that does not fit.
 */
export function checkColumns(mapping: PanelMapping, headers: readonly string[]): void {
  const chosen: readonly (readonly [string, string])[] = [
    ['/company', mapping.company],
    ['/year', mapping.year],
    ['/marketValue', mapping.marketValue],
    ['/capex', mapping.capex],
    ['/bookEquity', mapping.bookEquity],
    ...mapping.others.map((name, index) => [`/others/${index}`, name] as const),
    ...mapping.attributes.map((name, index) => [`/attributes/${index}`, name] as const),
  ];
  const { columns, currencies } = mapping.conversion;
  const named: readonly (readonly [string, string])[] = [
    ...columns.map(({ column }, index) => [`/conversion/columns/${index}/column`, column] as const),
    ...(currencies === null ? [] : [['/conversion/currencies/column', currencies.column] as const]),
  ];
  const known = new Set(headers);
  const seen = new Set<string>();
  const errors: FieldError[] = [];
  for (const [pointer, name] of [...chosen, ...named])
    if (!known.has(name))
      errors.push({ pointer, detail: `expected a column of the file; found “${name}”` });
  for (const [pointer, name] of chosen) {
    if (seen.has(name)) errors.push({ pointer, detail: `“${name}” is chosen for two things` });
    seen.add(name);
  }
  if (errors.length > 0) throw new Invalid('The choice of columns does not fit the file.', errors);
}
