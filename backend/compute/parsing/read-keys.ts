import { calendarYear } from './conversion/calendar-year';
import { CompanyCodes } from './company-codes';
import { dateOrder } from './date-order';
import { type CellRemark, findingAt, type FindingList } from './finding-list';
import { isMissing } from '../../panel-data/numbers/missing-cell';
import { type FiscalYear, parseFiscalYear } from './parse-year';
import type { ReadingTerms } from './reading-terms';
import type { Table } from './table';

/** Company and year of the rows that name both; such rows are placed in the panel. */
export interface PanelKeys {
  /** In the order of their first appearance. */
  readonly companies: readonly string[];
  readonly company: Int32Array;
  /** Calendar years. */
  readonly year: Int32Array;
  /** 16 · year + month of the fiscal year's end, the month being 0 where the text does not say. */
  readonly fiscalEnd: Int32Array;
  /** Row of the table, counted from 0. */
  readonly tableRow: Int32Array;
}

/** Finds every row that cannot be placed, and dates that can be read two ways where that matters. */
export function readKeys(
  table: Table,
  columns: { readonly companyIndex: number; readonly yearIndex: number },
  terms: ReadingTerms,
  findings: FindingList,
): PanelKeys {
  const { companyIndex, yearIndex } = columns;
  const fiscalYearOf = readYears(table, yearIndex, terms, findings);
  const codes = new CompanyCodes(terms);
  const rows = table.rows.length;
  const codeOfRow = new Int32Array(rows);
  const year = new Int32Array(rows);
  const fiscalEnd = new Int32Array(rows);
  const tableRow = new Int32Array(rows);
  let placed = 0;
  for (let row = 0; row < rows; row++) {
    const company = table.rows[row][companyIndex];
    const fault = companyFault(company, terms);
    const fiscalYear = fiscalYearOf(table.rows[row][yearIndex]);
    if (fault !== undefined) findings.add(findingAt(table, row, companyIndex, fault));
    if (fiscalYear === undefined) findings.add(findingAt(table, row, yearIndex, noYearAtAll));
    else if (fiscalYear === null) findings.add(findingAt(table, row, yearIndex, missingYear));
    else if (fault === undefined) {
      const code = codes.codeOf(company);
      codeOfRow[placed] = code;
      year[placed] = calendarYear(fiscalYear, terms.fiscalYears.rule, codes.endMonths[code]);
      fiscalEnd[placed] = 16 * fiscalYear.endYear + (fiscalYear.endMonth ?? 0);
      tableRow[placed] = row;
      placed += 1;
    }
  }
  return {
    companies: codes.companies,
    company: codeOfRow.slice(0, placed),
    year: year.slice(0, placed),
    fiscalEnd: fiscalEnd.slice(0, placed),
    tableRow: tableRow.slice(0, placed),
  };
}

/** Why a text names no company. */
function companyFault(text: string, { longestName }: ReadingTerms): CellRemark | undefined {
  if (isMissing(text)) return noCompany;
  return text.trim().length > longestName ? longName(longestName) : undefined;
}

type YearReader = (text: string) => FiscalYear | null | undefined;

/** Reads each different text of the year column once. */
function readYears(
  table: Table,
  yearIndex: number,
  terms: ReadingTerms,
  findings: FindingList,
): YearReader {
  const firstRow = new Map<string, number>();
  table.rows.forEach((cells, row) => {
    const text = cells[yearIndex];
    if (!firstRow.has(text)) firstRow.set(text, row);
  });
  const { order, isAmbiguous } = dateOrder(firstRow.keys());
  const known = new Map<string, FiscalYear | null | undefined>();
  let hasDoubt = false;
  for (const [text, row] of firstRow) {
    const fiscalYear = parseFiscalYear(text, order);
    const isTooEarly = fiscalYear != null && fiscalYear.endYear < terms.earliestYear;
    known.set(text, isTooEarly ? undefined : fiscalYear);
    if (!isAmbiguous || hasDoubt || fiscalYear == null) continue;
    hasDoubt = isOrderDecisive(text, fiscalYear, terms);
    if (hasDoubt) findings.add(findingAt(table, row, yearIndex, dayFirst));
  }
  return (text) => known.get(text);
}

/** Whether the other order of day and month would put the row into another calendar year. */
function isOrderDecisive(text: string, dayFirstYear: FiscalYear, terms: ReadingTerms): boolean {
  const other = parseFiscalYear(text, 'month-first');
  if (other == null) return false;
  const { rule, usualEndMonth } = terms.fiscalYears;
  return (
    calendarYear(other, rule, usualEndMonth) !== calendarYear(dayFirstYear, rule, usualEndMonth)
  );
}

const noCompany: CellRemark = {
  code: 'no-company',
  detail: 'No company is named: the row is left out.',
  isBlocking: false,
};
function longName(most: number): CellRemark {
  const detail = `Expected a company’s name of at most ${most} characters.`;
  return { code: 'no-company', detail, isBlocking: true };
}

const noYearAtAll: CellRemark = {
  code: 'year',
  detail: 'Expected a fiscal year, as 2023, FY2023, 2022/23 or the date of its end.',
  isBlocking: true,
};
const missingYear: CellRemark = {
  code: 'missing',
  detail: 'No year is given: the row is left out.',
  isBlocking: false,
};
const dayFirst: CellRemark = {
  code: 'year',
  detail:
    'Dates of this column can be read with the day or the month first, and none decides: the day is taken to come first.',
  isBlocking: false,
};
