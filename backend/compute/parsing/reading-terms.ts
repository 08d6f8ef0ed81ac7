import type { FiscalYearRule, TableReading } from '../file-recipe';

/** What reading a table's cells depends on besides the cells. */
export interface ReadingTerms {
  readonly decimalSign: TableReading['decimalSign'];
  readonly fiscalYears: FiscalYearRule;
  /** The company that a text names. */
  readonly companyOf: (text: string) => string;
  /** Years before this are no fiscal years. */
  readonly earliestYear: number;
  /** Characters of a company's name. */
  readonly longestName: number;
}

/** Cells speak for themselves: names as they stand, a fiscal year by its end, small numbers as years too. */
export const plainTerms: ReadingTerms = {
  decimalSign: 'as-found',
  fiscalYears: { rule: 'year-of-end', usualEndMonth: 12, companies: [] },
  companyOf: (text) => text,
  earliestYear: 0,
  longestName: Infinity,
};
