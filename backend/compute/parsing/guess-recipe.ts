import type { Conversion } from '../file-recipe';
import type { FilePreview } from '../parse-messages';
import { isCurrencyCode } from '../../panel-data/numbers/currency-code';
import { guessMapping, type MappingGuess } from './guess-mapping';
import { isNumber } from './header-row';
import { isMissing } from '../../panel-data/numbers/missing-cell';
import { type MoneyHint, moneyHint } from './money-hint';
import type { Table } from './table';

/** Rows that the guess of the columns looks at. */
const guessRows = 200;
const mostAttributes = 20;

/**
 * Guesses the recipe of a file by its headers and by what its rows hold; what nothing speaks for is absent.
 *
 * @param titles  texts above the header.
 */
export function guessRecipe(
  table: Omit<Table, 'delimiter'>,
  titles: readonly string[],
): FilePreview['guess'] {
  const roles = guessMapping(table.header, table.rows.slice(0, guessRows), table.isNumber);
  const codes = currencyColumn(table, roles);
  const attributes = attributeColumns(table, roles, codes?.column);
  const money = moneyOf(table.header, roles, titles);
  const currency = codes?.currencies[0] ?? money.currency;
  const isInSeveral = codes !== undefined && codes.currencies.length > 1;
  const conversion: Conversion = {
    columns: money.otherUnits,
    currencies: isInSeveral ? { column: codes.column, rates: [] } : null,
    prices: null,
    fiscalYears: { rule: 'year-of-end', usualEndMonth: 12, companies: [] },
  };
  return {
    ...roles,
    attributes,
    ...(currency !== undefined && { currency }),
    ...(money.unit !== undefined && { unit: money.unit }),
    ...((isInSeveral || money.otherUnits.length > 0) && { conversion }),
  };
}

interface CurrencyColumn {
  readonly column: string;
  /** The most frequent first. */
  readonly currencies: readonly string[];
}

/** The first column that holds hardly anything but currency codes. */
function currencyColumn(
  { header, rows }: Pick<Table, 'header' | 'rows'>,
  roles: MappingGuess,
): CurrencyColumn | undefined {
  for (const [index, column] of header.entries()) {
    if (column === roles.company) continue;
    const counts = new Map<string, number>();
    let filled = 0;
    for (const row of rows) {
      const text = row[index].trim();
      if (isMissing(text)) continue;
      filled += 1;
      if (isCurrencyCode(text)) counts.set(text, (counts.get(text) ?? 0) + 1);
    }
    const codes = [...counts].sort(([, left], [, right]) => right - left);
    const coded = codes.reduce((sum, [, count]) => sum + count, 0);
    if (filled > 0 && coded >= 0.8 * filled)
      return { column, currencies: codes.map(([code]) => code) };
  }
  return undefined;
}

/** Columns of text that hold one text for nearly every company: what describes the company and not the year. */
function attributeColumns(
  { header, rows }: Pick<Table, 'header' | 'rows'>,
  roles: MappingGuess,
  currency: string | undefined,
): readonly string[] {
  const companyIndex = roles.company === undefined ? -1 : header.indexOf(roles.company);
  if (companyIndex === -1) return [];
  const taken = new Set([roles.company, roles.year, ...numericColumnsOf(roles), currency]);
  return header
    .filter((name, index) => !taken.has(name) && isConstant(rows, companyIndex, index))
    .slice(0, mostAttributes);
}

function isConstant(rows: Table['rows'], companyIndex: number, index: number): boolean {
  const texts = new Map<string, string>();
  const changing = new Set<string>();
  let filled = 0;
  let numbers = 0;
  for (const row of rows) {
    const text = row[index].trim();
    if (isMissing(text)) continue;
    filled += 1;
    if (isNumber(text)) numbers += 1;
    const company = row[companyIndex].trim();
    const known = texts.get(company);
    if (known === undefined) texts.set(company, text);
    else if (known !== text) changing.add(company);
  }
  return (
    filled >= 0.5 * rows.length && numbers < 0.5 * filled && changing.size <= 0.05 * texts.size
  );
}

/** Currency and unit that most of the money columns name, else the titles; and the columns in another unit. */
function moneyOf(
  header: readonly string[],
  roles: MappingGuess,
  titles: readonly string[],
): MoneyHint & { readonly otherUnits: Conversion['columns'] } {
  const columns = numericColumnsOf(roles);
  const hints = columns.map((column) => ({ column, ...moneyHint(column) }));
  const fromTitles = titles.map(moneyHint);
  const unit =
    mostFrequent(hints.map((hint) => hint.unit)) ??
    mostFrequent(fromTitles.map((hint) => hint.unit));
  const currency =
    mostFrequent(hints.map((hint) => hint.currency)) ??
    mostFrequent(fromTitles.map((hint) => hint.currency));
  return {
    currency,
    unit,
    otherUnits: hints.flatMap((hint) =>
      hint.unit === undefined || hint.unit === unit
        ? []
        : [{ column: hint.column, unit: hint.unit, measure: null }],
    ),
  };
}

function numericColumnsOf(roles: MappingGuess): readonly string[] {
  const { marketValue, capex, bookEquity, others } = roles;
  return [marketValue, capex, bookEquity, ...others].filter((name) => name !== undefined);
}

/** Of equals the first. */
function mostFrequent<T>(values: readonly (T | undefined)[]): T | undefined {
  const counts = new Map<T, number>();
  for (const value of values)
    if (value !== undefined) counts.set(value, (counts.get(value) ?? 0) + 1);
  return [...counts].sort(([, left], [, right]) => right - left).at(0)?.[0];
}
