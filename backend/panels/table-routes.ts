import { setImmediate } from 'node:timers/promises';
import express, { type Router } from 'express';
import { apiRoutes, TableFile } from '../contract';
import { parse } from '../http/parse';
import { register } from '../http/register';
import type { TableCell } from './panel-table';
import { fileTypes, formatOf, sendTable } from './table-replies';
import type { NotedTable } from './table-workbook';

/** Rows that are some milliseconds of work. */
const partLength = 500;

/** Tables of a page as files: a chart's values, cells of a grid. Nothing is stored. */
export function tableRoutes(now: () => Date): Router {
  const router = express.Router();

  register(router, apiRoutes.makeTableFile, async (req, res) => {
    const format = formatOf(req);
    const noted = toNotedTable(parse(TableFile, req.body), now());
    res.attachment(`table.${format}`).type(fileTypes[format]);
    await sendTable(req, res, noted, { format, decimalSign: '.' });
  });

  return router;
}

function toNotedTable({ name, notes, columns, rows }: TableFile, createdAt: Date): NotedTable {
  return {
    name: 'Table',
    table: { headers: columns.map(({ header }) => header), parts: inParts(rows) },
    notes: {
      name: 'About',
      lines: [
        ['Table', name],
        ['Made on (UTC)', createdAt],
        ...notes.map(({ label, text }) => [label, text] as const),
      ],
    },
    createdAt,
  };
}

/** Between parts this process answers others. */
async function* inParts(
  rows: TableFile['rows'],
): AsyncGenerator<readonly (readonly TableCell[])[]> {
  for (let start = 0; start < rows.length; start += partLength) {
    if (start > 0) await setImmediate();
    yield rows.slice(start, start + partLength);
  }
}
