import { isMissing } from '../missing-cell';
import { type Table, type TableLimits, tableLimits } from '../table';
import { TableError } from '../table-error';
import { uniqueHeader } from '../unique-header';
import type { YearColumn } from './wide-header';
import { companyOf, type WideSheet } from './wide-sheet';
import type { YearLabel } from './year-label';

/** Year columns of one variable, by year. */
type ByYear = ReadonlyMap<string, YearColumn>;

/** The rows of one company: of one sheet row, or of all that name a variable of it. */
interface Block extends SheetRow {
  readonly company: string;
  readonly describing: readonly string[];
  /** Where the values of each variable stand. */
  readonly parts: Map<number, SheetRow & { readonly columns: ByYear }>;
}

interface SheetRow {
  readonly sheet: WideSheet;
  readonly row: number;
}

/** Turns rows with years in columns into a row a company and year. */
export class LongTableBuilder {
  readonly #blocks: Block[] = [];
  readonly #blocksOf = new Map<string, Block[]>();
  readonly #variables = new Map<string, { readonly index: number; readonly name: string }>();
  readonly #years = new Map<string, YearLabel>();
  readonly #repeated = new Set<string>();

  /**
   * @param companyHeader  header of the companies in the long table.
   * @param describing  headers of the columns that describe a row, in the order of the rows' texts.
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
    describing: readonly string[],
    byVariable: ReadonlyMap<number, ByYear>,
  ): void {
    const block = this.#begin(place, companyOf(place.sheet, place.row), describing);
    for (const [variable, columns] of byVariable) block.parts.set(variable, { ...place, columns });
  }

  /** Adds a sheet row that holds one variable of a company, to the company's first rows that have none of it yet. */
  addVariable(
    place: SheetRow,
    named: { readonly company: string; readonly variable: string },
    describing: readonly string[],
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
    const origins: { readonly block: Block; readonly key: string }[] = [];
    const rows: string[][] = [];
    for (const block of this.#blocks) {
      const [first, last] = filledRange(block, keys);
      for (const [key, label] of years.slice(first, last + 1)) {
        origins.push({ block, key });
        const values = names.map((_, variable) => textAt(block, variable, key));
        rows.push([block.company, label.text, ...block.describing, ...values]);
      }
      this.#refuseTooMany(rows.length, header.length);
    }
    const firstVariable = 2 + this.describing.length;
    return {
      header,
      repeatedHeaders: [...new Set([...repeatedHeaders, ...this.#repeated])],
      rows,
      lines: origins.map(({ block }) => lineOf(block)),
      placeOf: (row, column) => {
        const { block, key } = origins[row];
        if (column < firstVariable) return { line: lineOf(block), header: header[column] };
        const part = block.parts.get(column - firstVariable);
        const found = part?.columns.get(key)?.header;
        const prefix = (part ?? block).sheet.placePrefix;
        return {
          line: lineOf(part ?? block),
          header: prefix + (found ?? `${header[column]} ${this.#years.get(key)?.text ?? key}`),
        };
      },
      isFormula: (row, column) => {
        const { block, key } = origins[row];
        const part = block.parts.get(column - firstVariable);
        const found = part?.columns.get(key);
        if (part === undefined || found === undefined) return false;
        return part.sheet.grid.isFormula?.(part.row, found.column) ?? false;
      },
    };
  }

  #begin(place: SheetRow, company: string, describing: readonly string[]): Block {
    const block: Block = { ...place, company, describing, parts: new Map() };
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

function lineOf({ sheet, row }: SheetRow): number {
  return sheet.grid.lines[row];
}

function textAt(block: Block, variable: number, key: string): string {
  const part = block.parts.get(variable);
  const column = part?.columns.get(key)?.column;
  if (part === undefined || column === undefined) return '';
  return part.sheet.grid.rows[part.row][column] ?? '';
}

/**
 * First and last position of a year with a figure: before and after there are no rows, a gap between them stays one.
 * Last is before first where there is no figure at all.
 */
function filledRange(block: Block, keys: readonly string[]): readonly [number, number] {
  const isFilled = (key: string): boolean => {
    for (const variable of block.parts.keys())
      if (!isMissing(textAt(block, variable, key))) return true;
    return false;
  };
  const first = keys.findIndex(isFilled);
  return first === -1 ? [0, -1] : [first, keys.findLastIndex(isFilled)];
}
