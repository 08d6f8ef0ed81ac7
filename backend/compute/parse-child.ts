import { checkFile } from './check-file';
import { filePanel } from './file-panel';
import { previewOf } from './file-preview';
import type { ParseAnswer, ParseRequest } from './parse-messages';
import { FileRefusal } from './parsing/file-refusal';
import { readFile } from './parsing/read-file';
import { TableError } from './parsing/table-error';

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
  const { bytes, name } = request;
  try {
    switch (request.kind) {
      case 'preview':
        return {
          kind: 'preview',
          preview: previewOf(await readFile(bytes, name, request.reading)),
        };
      case 'check': {
        const file = await readFile(bytes, name, request.recipe.reading);
        return { kind: 'check', check: checkFile(file, request.recipe, request.current) };
      }
      case 'read': {
        const { table } = await readFile(bytes, name, request.recipe.reading);
        return { kind: 'read', panel: filePanel(table, request.recipe) };
      }
    }
  } catch (error) {
    if (error instanceof FileRefusal || error instanceof TableError)
      return { kind: 'refused', code: error.code, detail: error.message };
    throw error;
  }
}
