import { checkFile } from './check-file';
import { filePanel } from './file-panel';
import type { FilePreview, ParseAnswer, ParseRequest } from './parse-messages';
import { FileRefusal } from './parsing/file-refusal';
import { guessMapping } from './parsing/guess-mapping';
import { type FileTable, readFile } from './parsing/read-file';
import { TableError } from './parsing/table-error';

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
    const reading = request.kind === 'preview' ? request.reading : request.recipe.reading;
    const file = await readFile(request.bytes, request.name, reading);
    switch (request.kind) {
      case 'preview':
        return { kind: 'preview', preview: previewOf(file) };
      case 'check':
        return { kind: 'check', check: checkFile(file, request.recipe, request.current) };
      case 'read':
        return { kind: 'read', panel: filePanel(file.table, request.recipe) };
    }
  } catch (error) {
    if (error instanceof TableError || error instanceof FileRefusal)
      return { kind: 'refused', code: error.code, detail: error.message };
    throw error;
  }
}

function previewOf({ table, reading, sheets, topLines }: FileTable): FilePreview {
  return {
    sheets,
    reading,
    headers: table.header,
    firstRows: table.rows
      .slice(0, previewRows)
      .map((cells, index) => ({ row: table.lines[index], cells })),
    rowCount: table.rows.length,
    topLines,
    guess: guessMapping(table.header, table.rows.slice(0, guessRows)),
  };
}
