import type { IsCell } from '../grid';
import { type Table, type TableLimits, tableLimits } from '../table';
import { TableError } from '../table-error';
import { uniqueHeader } from '../unique-header';
import {
  type ByYear,
  type CellQuestion,
  type CompanyBlock,
  describingCell,
  type DescribingColumns,
  filledRange,
  isCell,
  lineOf,
  type SheetRow,
  textOf,
  valueCell,
} from './company-block';
import type { YearColumn } from './wide-header';
import { companyOf, type WideSheet } from './wide-sheet';
import type { YearLabel } from './year-label';

/** Columns of the long table before those that describe a row: company and year. */
const firstDescribing = 2;

/** Turns rows with years in columns into a row a company and year. */
export class LongTableBuilder {
  readonly #blocks: CompanyBlock[] = [];
  readonly #blocksOf = new Map<string, CompanyBlock[]>();
  readonly #variables = new Map<string, { readonly index: number; readonly name: string }>();
  readonly #years = new Map<string, YearLabel>();
  readonly #repeated = new Set<string>();

  /**
   * @param companyHeader  header of the companies in the long table.
   * @param describing  headers of the columns that describe a row, in the order of the rows' own columns.
   */
  constructor(
    private readonly companyHeader: string,
    private readonly describing: readonly string[],
    private readonly limits: TableLimits = tableLimits,
  ) {}

  /**
   * Groups a sheet's year columns by the variable that their headers name.
   *
   * @param unnamed  name of the variable of headers that are a year alone.
   */
  columnsByVariable(sheet: WideSheet, unnamed: string): ReadonlyMap<number, ByYear> {
    const byVariable = new Map<number, Map<string, YearColumn>>();
    for (const column of sheet.header.years) {
      const { label } = column;
      const variable = label.variable || unnamed;
      const key = this.#yearKey(label);
      let index = this.#variableIndex(variable);
      // A second column of the same variable and year is told apart as a second header is.
      for (let number = 2; byVariable.get(index)?.has(key) === true; number += 1) {
        this.#repeated.add(this.#nameOf(variable));
        index = this.#variableIndex(`${variable} (${number})`);
      }
      const columns = byVariable.get(index) ?? new Map<string, YearColumn>();
      byVariable.set(index, columns.set(key, column));
    }
    return byVariable;
  }

  /** The first column of each year: what a row that names its variable holds. */
  columnsByYear(sheet: WideSheet): ByYear {
    const columns = new Map<string, YearColumn>();
    for (const column of sheet.header.years) {
      const key = this.#yearKey(column.label);
      if (!columns.has(key)) columns.set(key, column);
    }
    return columns;
  }

  /** Adds a sheet row that holds all variables of a company. */
  addRow(
    place: SheetRow,
    describing: DescribingColumns,
    byVariable: ReadonlyMap<number, ByYear>,
  ): void {
    const block = this.#begin(place, companyOf(place.sheet, place.row), describing);
    for (const [variable, columns] of byVariable) block.parts.set(variable, { ...place, columns });
  }

  /** Adds a sheet row that holds one variable of a company, to the company's first rows that have none of it yet. */
  addVariable(
    place: SheetRow,
    named: { readonly company: string; readonly variable: string },
    describing: DescribingColumns,
    columns: ByYear,
  ): void {
    const index = this.#variableIndex(named.variable);
    const block =
      this.#blocksOf.get(named.company)?.find(({ parts }) => !parts.has(index)) ??
      this.#begin(place, named.company, describing);
    block.parts.set(index, { ...place, columns });
  }

  /** @throws {TableError} 'table-too-large' */
  finish(): Omit<Table, 'delimiter'> {
    const years = [...this.#years].sort(
      ([, left], [, right]) => left.year - right.year || (left.month ?? 0) - (right.month ?? 0),
    );
    const keys = years.map(([key]) => key);
    const names = [...this.#variables.values()].map(({ name }) => name);
    const { header, repeatedHeaders } = uniqueHeader([
      this.companyHeader,
      'Year',
      ...this.describing,
      ...names,
    ]);
    const origins: { readonly block: CompanyBlock; readonly year: string }[] = [];
    const rows: string[][] = [];
    for (const block of this.#blocks) {
      const [first, last] = filledRange(block, keys);
      const describing = block.describing.map((_, place) => textOf(describingCell(block, place)));
      for (const [year, label] of years.slice(first, last + 1)) {
        origins.push({ block, year });
        const values = names.map((_, variable) => textOf(valueCell(block, variable, year)));
        rows.push([block.company, label.text, ...describing, ...values]);
      }
      this.#refuseTooMany(rows.length, header.length);
    }
    const firstVariable = firstDescribing + this.describing.length;
    const asking = (question: CellQuestion): IsCell => {
      return (row, column) => {
        const { block, year } = origins[row];
        return column < firstVariable
          ? isCell(describingCell(block, column - firstDescribing), question)
          : isCell(valueCell(block, column - firstVariable, year), question);
      };
    };
    return {
      header,
      repeatedHeaders: [...new Set([...repeatedHeaders, ...this.#repeated])],
      rows,
      lines: origins.map(({ block }) => lineOf(block)),
      placeOf: (row, column) => {
        const { block, year } = origins[row];
        if (column < firstVariable) return { line: lineOf(block), header: header[column] };
        const part = block.parts.get(column - firstVariable);
        const found = part?.columns.get(year)?.header;
        const prefix = (part ?? block).sheet.placePrefix;
        return {
          line: lineOf(part ?? block),
          header: prefix + (found ?? `${header[column]} ${this.#years.get(year)?.text ?? year}`),
        };
      },
      ...(this.#knows('isFormula') && { isFormula: asking('isFormula') }),
      ...(this.#knows('isNumber') && { isNumber: asking('isNumber') }),
    };
  }

  #knows(question: CellQuestion): boolean {
    return this.#blocks.some(({ parts, sheet }) =>
      [{ sheet }, ...parts.values()].some((part) => part.sheet.grid[question] !== undefined),
    );
  }

  #begin(place: SheetRow, company: string, describing: DescribingColumns): CompanyBlock {
    const block: CompanyBlock = { ...place, company, describing, parts: new Map() };
    this.#blocks.push(block);
    const known = this.#blocksOf.get(company);
    if (known === undefined) this.#blocksOf.set(company, [block]);
    else known.push(block);
    return block;
  }

  #yearKey(label: YearLabel): string {
    const key = `${label.year}-${label.month ?? ''}`;
    if (!this.#years.has(key)) this.#years.set(key, label);
    return key;
  }

  #variableIndex(name: string): number {
    const key = variableKey(name);
    const found = this.#variables.get(key) ?? { index: this.#variables.size, name };
    this.#variables.set(key, found);
    return found.index;
  }

  #nameOf(variable: string): string {
    return this.#variables.get(variableKey(variable))?.name ?? variable;
  }

  #refuseTooMany(rows: number, columns: number): void {
    const most = Math.min(this.limits.rows, Math.floor(this.limits.cells / columns));
    if (rows > most)
      throw new TableError(
        'table-too-large',
        `expected at most ${most} rows of ${columns} columns, a row a company and year; this file has more`,
      );
  }
}

/** `Market value` and `market_value` are one variable. */
function variableKey(name: string): string {
  return name
    .toLowerCase()
    .replace(/[\s_-]+/gu, ' ')
    .trim();
}
