import { guessMapping } from '../guess-mapping';
import type { Grid, IsCell } from '../grid';
import { type WideHeader, wideHeader } from './wide-header';

/** One sheet with years in columns. */
export interface WideSheet {
  readonly grid: Grid;
  readonly headerIndex: number;
  readonly header: WideHeader;
  readonly companyColumn: number;
  /** The sheet's name before its headers, where several sheets have the same ones. */
  readonly placePrefix: string;
}

const sampledRows = 200;

/** A sheet as one with years in columns; undefined where no header holds a year or no column could name companies. */
export function wideSheet(
  grid: Grid,
  headerIndex: number,
  placePrefix = '',
): WideSheet | undefined {
  const header = wideHeader(grid, headerIndex);
  if (header.years.length === 0 || header.plain.length === 0) return undefined;
  const sample = grid.rows
    .slice(headerIndex + 1, headerIndex + 1 + sampledRows)
    .map((cells) => header.plain.map(({ column }) => cells[column] ?? ''));
  const names = header.plain.map((plain) => plain.header);
  const isNumber: IsCell = (row, index) =>
    grid.isNumber?.(headerIndex + 1 + row, header.plain[index].column) ?? false;
  const company = guessMapping(names, sample, isNumber).company;
  const found = header.plain.find((plain) => plain.header === company) ?? header.plain[0];
  return { grid, headerIndex, header, companyColumn: found.column, placePrefix };
}

/** The text of a row's company cell. */
export function companyOf({ grid, companyColumn }: WideSheet, row: number): string {
  return (grid.rows[row][companyColumn] ?? '').trim();
}
