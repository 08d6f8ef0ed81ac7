import * as z from 'zod';

/** How many cells a table may have that is made a file. */
export const mostTableCells = 200_000;

const text = z.string().max(2000);
const TableCell = z.union([text, z.number(), z.null()]);

/**
 * A table to be made a file, as CSV or XLSX; answered with the file. Nothing of it is stored. Numbers are written as
 * they are, in their shortest form that reads back the same; null is an empty cell.
 */
export const TableFile = z
  .strictObject({
    /** What the table shows. */
    name: z.string().trim().min(1).max(500),
    /** What a workbook says of the table on its second sheet, a line each. */
    notes: z.array(z.strictObject({ label: z.string().max(100), text })).max(20),
    /** Headers with their units. */
    columns: z
      .array(z.strictObject({ header: text }))
      .min(1)
      .max(1000),
    rows: z.array(z.array(TableCell).max(1000)).max(mostTableCells),
  })
  .superRefine(({ columns, rows }, context) => {
    const odd = rows.findIndex((row) => row.length !== columns.length);
    if (odd !== -1)
      context.addIssue({
        code: 'custom',
        path: ['rows', odd],
        message: `expected a cell for each of ${columns.length} columns; found ${rows[odd].length}`,
      });
    const cells = rows.length * columns.length;
    if (cells > mostTableCells)
      context.addIssue({
        code: 'custom',
        path: ['rows'],
        message: `expected at most ${mostTableCells} cells; found ${cells}`,
      });
  });
export type TableFile = z.infer<typeof TableFile>;
