import { checkTable } from './parsing/check-table';
import type { TableMapping } from './parsing/column-indices';
import { guessMapping } from './parsing/guess-mapping';
import { readPanel } from './parsing/read-panel';
import { readTable } from './parsing/read-table';
import type { Table } from './parsing/table';
import { TableError } from './parsing/table-error';
import type {
  ColumnChoice,
  FilePreview,
  FileRows,
  ParseAnswer,
  ParseRequest,
} from './parse-messages';

const previewRows = 12;
/** Rows that the guess of the mapping looks at. */
const guessRows = 200;

/** Answers one request and ends: whatever a file does to this process, the next one starts anew. */
process.once('message', (request: ParseRequest) => {
  answer(request).then(
    (reply) => {
      process.send?.(reply);
    },
    (error: unknown) => {
      process.stderr.write(`${String(error)}\n`);
      process.exit(1);
    },
  );
});

async function answer(request: ParseRequest): Promise<ParseAnswer> {
  try {
    const table = await readTable(request.bytes);
    switch (request.kind) {
      case 'preview':
        return { kind: 'preview', preview: previewOf(table) };
      case 'check':
        return { kind: 'check', check: checkTable(table, mappingOf(request.choice)) };
      case 'read':
        return { kind: 'read', rows: rowsOf(table, request.choice) };
    }
  } catch (error) {
    if (error instanceof TableError)
      return { kind: 'refused', code: error.code, detail: error.message };
    throw error;
  }
}

function previewOf(table: Table): FilePreview {
  return {
    headers: table.header,
    firstRows: table.rows
      .slice(0, previewRows)
      .map((cells, index) => ({ row: table.lines[index], cells })),
    rowCount: table.rows.length,
    guess: guessMapping(table.header, table.rows.slice(0, guessRows)),
  };
}

function mappingOf(choice: ColumnChoice): TableMapping {
  return {
    company: choice.company,
    year: choice.year,
    numbers: [choice.marketValue, choice.capex, choice.bookEquity, ...choice.others],
  };
}

function rowsOf(table: Table, choice: ColumnChoice): FileRows {
  const reading = readPanel(table, mappingOf(choice));
  return {
    company: Array.from(reading.company, (code) => reading.companies[code]),
    year: Array.from(reading.year),
    fileRow: Array.from(reading.fileRow),
    cells: Array.from(reading.year, (_, row) =>
      reading.numbers.map(({ values }) => (Number.isNaN(values[row]) ? null : values[row])),
    ),
  };
}
