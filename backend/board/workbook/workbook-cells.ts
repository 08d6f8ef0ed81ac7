import type excel from 'exceljs';

/** Marks a cell that a person may change: blue figures on a light ground. */
export function markInput(cell: excel.Cell): void {
  cell.font = { ...plain, color: { argb: 'FF1F4E9E' } };
  cell.fill = { type: 'pattern', pattern: 'solid', fgColor: { argb: 'FFF3EFE7' } };
}

/** Named in every cell that names a font at all: without a name some programs take another family. */
const plain = { name: 'Arial', size: 10 } as const;
export const bold = { ...plain, bold: true } as const;
export const quiet = { ...plain, color: { argb: 'FF566070' } } as const;
/** Shown with thousands apart; the cell holds every digit. */
export const amountFormat = '#,##0.0##';

/** `B7`, or `$B$7` where it is to stay when it is copied. */
export function address(column: number, row: number, isFixed = false): string {
  const mark = isFixed ? '$' : '';
  return `${mark}${columnName(column)}${mark}${row}`;
}

/** `A` for 1, `AB` for 28. */
export function columnName(column: number): string {
  let name = '';
  for (let rest = column; rest > 0; rest = Math.floor((rest - 1) / 26))
    name = String.fromCharCode(65 + ((rest - 1) % 26)) + name;
  return name;
}

/** Widths of the first columns, in characters. */
export function widths(sheet: excel.Worksheet, list: readonly number[]): void {
  list.forEach((width, index) => {
    sheet.getColumn(index + 1).width = width;
  });
}

/** One font for all cells, and a page as wide as the sheet. */
export function finishSheet(sheet: excel.Worksheet): void {
  sheet.pageSetup = { orientation: 'landscape', fitToPage: true, fitToWidth: 1, fitToHeight: 0 };
  sheet.eachRow((row) => {
    row.eachCell((cell) => {
      if (cell.font?.name === undefined) cell.font = { ...plain, ...cell.font };
    });
  });
}
