import { type Conversion, ImportMapping, type TableReading } from '@contract';
import { type MappingEntry, columnChoices, freeColumns } from './mapping-entry';
import { isYear, readRates } from './rate-table';
import { readFigures } from './read-figures';

/** What keeps the entries of each part from being a mapping; what a single field lacks, the field says itself. */
export interface EntryProblems {
  readonly columns: readonly string[];
  readonly currencies: readonly string[];
  readonly prices: readonly string[];
  readonly fiscalYears: readonly string[];
}

export interface ReadEntry {
  /** Null while there are problems. */
  readonly mapping: ImportMapping | null;
  readonly problems: EntryProblems;
}

/** The entries as the mapping that the server checks. */
export function readEntry(
  entry: MappingEntry,
  headers: readonly string[],
  reading: TableReading,
): ReadEntry {
  const free = new Set(freeColumns(headers, entry));
  const others = entry.others.filter((header) => free.has(header));
  const attributes = entry.attributes.filter(
    (header) => free.has(header) && !others.includes(header),
  );
  const figures = new Set([entry.marketValue, entry.capex, entry.bookEquity, ...others]);
  const currencies = readCurrencies(entry);
  const prices = readPrices(entry);
  const fiscalYears = readFiscalYears(entry);
  const candidate = ImportMapping.safeParse({
    panelName: entry.panelName,
    company: entry.company,
    year: entry.year,
    marketValue: entry.marketValue,
    capex: entry.capex,
    bookEquity: entry.bookEquity,
    others,
    attributes,
    currency: entry.currency.trim().toUpperCase(),
    unit: entry.unit,
    reading,
    conversion: {
      columns: entry.columns.filter(({ column }) => figures.has(column)).flatMap(told),
      currencies: currencies.value,
      prices: prices.value,
      fiscalYears: fiscalYears.value,
    },
    mending: entry.mending,
  });
  const problems = {
    columns: [
      ...tooMany(others, 50, 'further columns'),
      ...tooMany(attributes, 20, 'describing columns'),
    ],
    currencies: currencies.problems,
    prices: prices.problems,
    fiscalYears: fiscalYears.problems,
  };
  const isFine = Object.values(problems).every((words) => words.length === 0);
  return { mapping: isFine && candidate.success ? candidate.data : null, problems };
}

/** Whether two mappings ask for the same panel, whatever the order of what has none. */
export function isSameMapping(left: ImportMapping | null, right: Partial<ImportMapping>): boolean {
  const parsed = ImportMapping.safeParse(right);
  if (left === null || !parsed.success) return false;
  return canonical(left) === canonical(withEncoding(parsed.data, left.reading.encoding));
}

/** Where a mapping left the encoding to be recognised, the recognised one is no change. */
function withEncoding(
  mapping: ImportMapping,
  encoding: ImportMapping['reading']['encoding'],
): ImportMapping {
  const { reading } = mapping;
  return { ...mapping, reading: { ...reading, encoding: reading.encoding ?? encoding } };
}

function readCurrencies({ currencyColumn, rates }: MappingEntry): {
  readonly value: Conversion['currencies'];
  readonly problems: readonly string[];
} {
  if (currencyColumn === '') return { value: null, problems: [] };
  const read = readRates(rates);
  return { value: { column: currencyColumn, rates: [...read.rates] }, problems: read.problems };
}

function readPrices({ isReal, baseYear, index }: MappingEntry): {
  readonly value: Conversion['prices'];
  readonly problems: readonly string[];
} {
  if (!isReal) return { value: null, problems: [] };
  const filled = index.filter(({ year, value }) => year !== '' || value !== '');
  const values = readFigures(filled.map(({ value }) => value));
  const problems = filled.flatMap(({ year, value }, place) => {
    if (isYear(year.trim()) && (values[place] ?? 0) > 0) return [];
    return [`expected a year and an index above zero, as 2020 and 104.2; found ${year} · ${value}`];
  });
  if (!isYear(baseYear.trim()))
    problems.unshift('expected the year whose prices count, as 2020, or no real terms');
  else if (!filled.some(({ year }) => year.trim() === baseYear.trim()))
    problems.unshift(`expected the price index of ${baseYear}; it is not in the table`);
  const read = filled.map(({ year }, place) => ({
    year: Number(year),
    value: values[place] ?? Number.NaN,
  }));
  const value = problems.length > 0 ? null : { baseYear: Number(baseYear), index: read };
  return { value, problems };
}

function readFiscalYears({ fiscalYears }: MappingEntry): {
  readonly value: Conversion['fiscalYears'];
  readonly problems: readonly string[];
} {
  const companies = fiscalYears.companies
    .map(({ company, endMonth }) => ({ company: company.trim(), endMonth }))
    .filter(({ company }) => company !== '');
  const names = companies.map(({ company }) => company);
  const doubled = names.find((name, place) => names.indexOf(name) < place);
  return {
    value: { ...fiscalYears, companies },
    problems: doubled === undefined ? [] : [`${doubled} has two months; expected one`],
  };
}

function tooMany(names: readonly string[], most: number, what: string): readonly string[] {
  return names.length > most ? [`expected at most ${most} ${what}; found ${names.length}`] : [];
}

/** Only what differs from the panel's unit and from figures that are no money is said. */
function told(column: Conversion['columns'][number]): Conversion['columns'] {
  const measure = column.measure === 'no-money' ? null : column.measure;
  return column.unit === null && measure === null ? [] : [{ ...column, measure }];
}

function canonical(mapping: ImportMapping): string {
  const { reading, conversion, mending } = mapping;
  const { layout } = reading;
  return JSON.stringify([
    columnChoices.map(({ key }) => mapping[key]),
    [mapping.panelName, mapping.currency, mapping.unit],
    [...mapping.others].sort(),
    [...mapping.attributes].sort(),
    [reading.sheet, reading.headerRow, reading.decimalSign, reading.encoding, layout.kind],
    layout.kind === 'years-in-columns' ? layout.item : null,
    layout.kind === 'sheet-a-variable' ? layout.sheets : null,
    sorted(conversion.columns.flatMap(told), ({ column, unit, measure }) => [
      column,
      unit,
      measure,
    ]),
    conversion.currencies?.column ?? null,
    sorted(conversion.currencies?.rates ?? [], ({ currency, year, average, yearEnd }) => [
      currency,
      year,
      average,
      yearEnd,
    ]),
    conversion.prices?.baseYear ?? null,
    sorted(conversion.prices?.index ?? [], ({ year, value }) => [year, value]),
    [conversion.fiscalYears.rule, conversion.fiscalYears.usualEndMonth],
    sorted(conversion.fiscalYears.companies, ({ company, endMonth }) => [company, endMonth]),
    sorted(mending.cells, ({ row, column, text }) => [row, column, text]),
    [...mending.excludedRows].sort((one, other) => one - other),
    mending.renames.map(({ from, to }) => [from, to]),
  ]);
}

function sorted<T>(values: readonly T[], parts: (value: T) => readonly unknown[]): string[] {
  return values.map((value) => JSON.stringify(parts(value))).sort();
}
