import type { PanelColumn } from '../panel-data';

export type Unit = 'units' | 'thousands' | 'millions' | 'billions';

export type TableLayout =
  | { readonly kind: 'long' }
  | { readonly kind: 'years-in-columns'; readonly item: string | null }
  | { readonly kind: 'sheet-a-variable'; readonly sheets: readonly string[] };

export type TextEncoding = 'utf-8' | 'windows-1252' | 'utf-16';

/** How a file becomes a table: sheet, header and layout. */
export interface TableReading {
  /** Null for a CSV file. */
  readonly sheet: string | null;
  /** Line that holds the column headers, the first being 1. */
  readonly headerRow: number;
  readonly layout: TableLayout;
  readonly decimalSign: 'as-found' | '.' | ',';
  /** Of a CSV file; absent for a workbook, or to have it recognised. */
  readonly encoding?: TextEncoding;
}

/** What a column measures: a flow is converted at the average rate of its year, a stock at the year-end one. */
export type Measure = 'flow' | 'stock' | 'no-money';

export interface CurrencyRate {
  readonly currency: string;
  readonly year: number;
  readonly average: number | null;
  readonly yearEnd: number | null;
}

export interface FiscalYearRule {
  readonly rule: 'year-of-end' | 'year-of-most-months';
  /** 1 to 12. */
  readonly usualEndMonth: number;
  readonly companies: readonly { readonly company: string; readonly endMonth: number }[];
}

/** How figures in the file's own terms become the panel's. */
export interface Conversion {
  readonly columns: readonly {
    readonly column: string;
    readonly unit: Unit | null;
    readonly measure: Measure | null;
  }[];
  readonly currencies: { readonly column: string; readonly rates: readonly CurrencyRate[] } | null;
  readonly prices: {
    readonly baseYear: number;
    readonly index: readonly { readonly year: number; readonly value: number }[];
  } | null;
  readonly fiscalYears: FiscalYearRule;
}

/** What is mended before the file becomes a panel. */
export interface FileMending {
  readonly cells: readonly {
    readonly row: number;
    readonly column: string;
    readonly text: string;
  }[];
  readonly excludedRows: readonly number[];
  readonly renames: readonly { readonly from: string; readonly to: string }[];
}

/** From file to panel, completely: the same bytes and recipe give the same rows. */
export interface FileRecipe {
  readonly company: string;
  readonly year: string;
  readonly marketValue: string;
  readonly capex: string;
  readonly bookEquity: string;
  readonly others: readonly string[];
  readonly attributes: readonly string[];
  readonly currency: string;
  readonly unit: Unit;
  readonly reading: TableReading;
  readonly conversion: Conversion;
  readonly mending: FileMending;
}

/** The headers of the recipe's numeric columns in the order of a panel's cells. */
export function numericColumns(recipe: FileRecipe): readonly string[] {
  return [recipe.marketValue, recipe.capex, recipe.bookEquity, ...recipe.others];
}

/** The same with what each is to the model. */
export function panelColumns(recipe: FileRecipe): readonly PanelColumn[] {
  const roles = ['marketValue', 'capex', 'bookEquity'] as const;
  return numericColumns(recipe).map((name, place) => ({ name, role: roles[place] ?? 'other' }));
}
