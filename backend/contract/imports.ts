import * as z from 'zod';
import { CellDifference, Unit } from './panels';

const header = z.string().min(1).max(500);
const company = z.string().min(1).max(200);
const month = z.number().int().min(1).max(12);
const year = z.number().int().min(1000).max(9999);

/** Where the table stands in the file and which way its years run. */
export const TableLayout = z.discriminatedUnion('kind', [
  /** A row a company and year. */
  z.strictObject({ kind: z.literal('long') }),
  /**
   * Years in columns: each header holds a variable and a year, or a row above the header names the variable of a block
   * of years; with `item`, each row is one variable of one company and that column names it.
   */
  z.strictObject({ kind: z.literal('years-in-columns'), item: header.nullable() }),
  /** Years in columns, one sheet a variable: the sheet's name is the variable's. */
  z.strictObject({
    kind: z.literal('sheet-a-variable'),
    sheets: z.array(z.string()).min(1).max(20),
  }),
]);
export type TableLayout = z.infer<typeof TableLayout>;

export const TextEncoding = z.enum(['utf-8', 'windows-1252', 'utf-16']);
export type TextEncoding = z.infer<typeof TextEncoding>;

/** How a file becomes a table: sheet, header and layout. */
export const TableReading = z.strictObject({
  /** Null for a CSV file. */
  sheet: z.string().max(200).nullable(),
  /** Line of the file or sheet that holds the column headers, the first being 1. */
  headerRow: z.number().int().min(1).max(1000),
  layout: TableLayout,
  /** `as-found` decides by each column's own numbers. */
  decimalSign: z.enum(['as-found', '.', ',']),
  /** How the text of a CSV file is written; absent for a workbook, or to have it recognised. */
  encoding: TextEncoding.optional(),
});
export type TableReading = z.infer<typeof TableReading>;

/** One rate: what one unit of `currency` costs in the panel's currency in a calendar year. */
export const CurrencyRate = z.strictObject({
  currency: z.string().regex(/^[A-Z]{3}$/, 'expected a currency code of three letters, as EUR'),
  year,
  /** For flows: capex. */
  average: z.number().positive().nullable(),
  /** For stocks: market value, book equity. */
  yearEnd: z.number().positive().nullable(),
});
export type CurrencyRate = z.infer<typeof CurrencyRate>;

/** What a further column measures: a flow is converted at the average rate, a stock at the year-end one. */
export const Measure = z.enum(['flow', 'stock', 'no-money']);
export type Measure = z.infer<typeof Measure>;

/** One rate, or one index, for each key: of two, none is the right one. */
function once<T>(keyOf: (each: T) => string, what: string) {
  return (list: readonly T[], context: z.core.$RefinementCtx): void => {
    const seen = new Set<string>();
    list.forEach((each, place) => {
      const key = keyOf(each);
      if (seen.has(key))
        context.addIssue({
          code: 'custom',
          path: [place],
          message: `expected one ${what}; found a second for ${key}`,
        });
      seen.add(key);
    });
  };
}

/** How figures in the file's own terms become the panel's. */
export const Conversion = z.strictObject({
  /** Columns whose unit is not the panel's; and what a further column measures (`no-money` unless said). */
  columns: z
    .array(z.strictObject({ column: header, unit: Unit.nullable(), measure: Measure.nullable() }))
    .max(200),
  /** A column of currency codes by row, with the rates into the panel's currency. */
  currencies: z
    .strictObject({
      column: header,
      rates: z
        .array(CurrencyRate)
        .max(10_000)
        .superRefine(
          once(({ currency, year }) => `${currency} ${year}`, 'rate a currency and year'),
        ),
    })
    .nullable(),
  /** Real terms: money of year t is multiplied by index(base) / index(t). */
  prices: z
    .strictObject({
      baseYear: year,
      index: z
        .array(z.strictObject({ year, value: z.number().positive() }))
        .max(1000)
        .superRefine(once((each) => String(each.year), 'price index a year')),
    })
    .nullable(),
  /**
   * Which calendar year a fiscal year belongs to: the one it ends in, or the one that holds most of its months (a year
   * that ends in January to May belongs to the year before). A date tells its own month; a year without one is taken
   * to end in the company's month, or the usual one.
   */
  fiscalYears: z.strictObject({
    rule: z.enum(['year-of-end', 'year-of-most-months']),
    usualEndMonth: month,
    companies: z.array(z.strictObject({ company, endMonth: month })).max(8000),
  }),
});
export type Conversion = z.infer<typeof Conversion>;

/** What the analyst mends before the file becomes a panel; the file itself never changes. */
export const FileMending = z.strictObject({
  /** Cells as they should read; `row` is a line of the file or sheet, `column` a header. */
  cells: z
    .array(
      z.strictObject({ row: z.number().int().min(1), column: header, text: z.string().max(500) }),
    )
    .max(5000),
  excludedRows: z.array(z.number().int().min(1)).max(200_000),
  /** Spellings of one company: `from` is read as `to`. */
  renames: z.array(z.strictObject({ from: company, to: company })).max(2000),
});
export type FileMending = z.infer<typeof FileMending>;

export const plainReading: TableReading = {
  sheet: null,
  headerRow: 1,
  layout: { kind: 'long' },
  decimalSign: 'as-found',
};
export const noConversion: Conversion = {
  columns: [],
  currencies: null,
  prices: null,
  fiscalYears: { rule: 'year-of-end', usualEndMonth: 12, companies: [] },
};
export const noMending: FileMending = { cells: [], excludedRows: [], renames: [] };

/**
 * From file to panel, completely: the same file and mapping give the same panel version. Columns are named by their
 * header; of a wide table, by the long table that it is read as: company, `Year`, then one column a variable.
 */
export const ImportMapping = z.strictObject({
  panelName: z.string().trim().min(1, 'expected a name for the panel').max(120),
  company: header,
  year: header,
  marketValue: header,
  capex: header,
  bookEquity: header,
  /** Further numeric columns to bring in. */
  others: z.array(header).max(50),
  /** Columns of text that describe a company, as industry or country; the last one given counts. */
  attributes: z.array(header).max(20).default([]),
  /** The panel's currency, ISO 4217. */
  currency: z.string().regex(/^[A-Z]{3}$/, 'expected a currency code of three letters, as EUR'),
  /** The panel's unit. */
  unit: Unit,
  reading: TableReading.default(plainReading),
  conversion: Conversion.default(noConversion),
  mending: FileMending.default(noMending),
});
export type ImportMapping = z.infer<typeof ImportMapping>;

/** One thing the check found, at one place of the file. */
export const ImportFinding = z.object({
  /** Line of the file or sheet, the first being line 1. */
  row: z.number().int(),
  column: z.string(),
  found: z.string(),
  code: z.enum([
    'missing',
    'duplicate',
    'not-a-number',
    'ambiguous-number',
    'year',
    'no-company',
    'spelling',
    'no-rate',
    'currency',
    /** A figure with the sign or code of another currency. */
    'other-currency',
    /** A company’s name that says it is a sum or a mean of others. */
    'sum',
    'no-price-index',
    'formula',
    /** A mended cell or a left-out line that the file, as it is read, does not have. */
    'mending',
  ]),
  detail: z.string(),
  /** Whether the panel cannot be brought in while this stands. */
  isBlocking: z.boolean(),
  /** Of a duplicate: line of the first row with the same company and year; absent on that row itself. */
  sameAs: z.number().int().optional(),
});
export type ImportFinding = z.infer<typeof ImportFinding>;

export const FileSheet = z.object({
  name: z.string(),
  rows: z.number().int(),
  columns: z.number().int(),
});
export type FileSheet = z.infer<typeof FileSheet>;

/** A row of the file that has findings, as it stands there, with what was mended. */
export const ReviewRow = z.object({
  row: z.number().int(),
  /** One text a header of the reply's `headers`. */
  cells: z.array(z.string()),
  /** Whether the row becomes part of the panel as things stand. */
  isTaken: z.boolean(),
  isExcluded: z.boolean(),
});
export type ReviewRow = z.infer<typeof ReviewRow>;

/** What bringing the file in would change in the newest version of the panel of the same name. */
export const ImportChanges = z.object({
  panelVersionId: z.uuid(),
  number: z.number().int(),
  addedRows: z.number().int(),
  removedRows: z.number().int(),
  changedCells: z.number().int(),
  /** At most 500 are listed; the counts are over all. */
  listed: z.array(CellDifference),
});
export type ImportChanges = z.infer<typeof ImportChanges>;

export const ImportCheck = z.object({
  companies: z.number().int(),
  years: z.number().int(),
  firstYear: z.number().int().nullable(),
  lastYear: z.number().int().nullable(),
  rows: z.number().int(),
  completeRows: z.number().int(),
  /** Rows of the file that are not taken: excluded, or without company or year. */
  leftOutRows: z.number().int(),
  /** At most 500 are listed; the counts are over all. */
  findings: z.array(ImportFinding),
  findingCount: z.number().int(),
  blockingCount: z.number().int(),
  /** The rows that the listed findings stand in. */
  reviewRows: z.array(ReviewRow),
  /**
   * Names that may be one company, with how many rows of the file each has, the likeliest first; at most 500 groups. A
   * name without a row is a company of the panel's newest version.
   */
  spellings: z.array(z.array(z.object({ company: z.string(), rows: z.number().int() }))),
  /** Currencies and years that the rates must cover and do not. */
  missingRates: z.array(z.object({ currency: z.string(), years: z.array(z.number().int()) })),
  /** Cells whose formula was left aside for its stored value. */
  formulaCells: z.number().int(),
  /** The first rows as the panel would hold them; values in the order market value, capex, book equity, others. */
  firstRows: z.array(
    z.object({
      row: z.number().int(),
      company: z.string(),
      year: z.number().int(),
      values: z.array(z.number().nullable()),
    }),
  ),
  changes: ImportChanges.nullable(),
});
export type ImportCheck = z.infer<typeof ImportCheck>;

export const ImportReply = z.object({
  id: z.uuid(),
  fileName: z.string(),
  byteSize: z.number().int(),
  /** `committing` while its rows are written; `failed` can be committed again. */
  state: z.enum(['mapped', 'checked', 'committing', 'failed', 'committed']),
  /** Sheets of a workbook; empty for a CSV file. */
  sheets: z.array(FileSheet),
  /** How the file is read just now. */
  reading: TableReading,
  /** The table's header and its first rows, as text; of a wide table, as the long one that it is read as. */
  headers: z.array(z.string()),
  firstRows: z.array(z.object({ row: z.number().int(), cells: z.array(z.string()) })),
  rowCount: z.number().int(),
  /** The first lines of the sheet as they stand, for choosing the header. */
  topLines: z.array(z.object({ row: z.number().int(), cells: z.array(z.string()) })),
  /** The likely mapping before a check; the analyst's own after it. */
  mapping: ImportMapping.partial(),
  check: ImportCheck.nullable(),
  /** Rows written so far, while committing. */
  progress: z.object({ done: z.number().int(), of: z.number().int() }).nullable(),
  /** Why the last commit did not work. */
  failure: z.string().nullable(),
  panelVersionId: z.uuid().nullable(),
});
export type ImportReply = z.infer<typeof ImportReply>;

/** An import on its way to a panel version: not committed, not discarded. */
export const OpenImport = ImportReply.pick({ id: true, fileName: true, state: true }).extend({
  /** When the file was brought in. */
  at: z.iso.datetime(),
  by: z.string(),
});
export type OpenImport = z.infer<typeof OpenImport>;

/** The newest first. */
export const OpenImportsReply = z.object({ imports: z.array(OpenImport) });
export type OpenImportsReply = z.infer<typeof OpenImportsReply>;

/**
 * Makes a checked import a panel version, in the background; answered with 409 `stale-version` and `latestId` when the
 * panel has another version since the check.
 */
export const CommitImport = z.strictObject({ note: z.string().trim().max(2000) });
export type CommitImport = z.infer<typeof CommitImport>;
