import type { FilePreview, NumberedLine } from './parse-messages';
import { guessRecipe } from './parsing/guess-recipe';
import type { FileTable } from './parsing/read-file';

const previewRows = 12;
/** A longer text is shown by its beginning. */
const shownLength = 200;

/** What a person needs to see of a file to say how it is read and which column is what. */
export function previewOf({ table, reading, sheets, topLines }: FileTable): FilePreview {
  const titles = topLines.filter(({ row }) => row < reading.headerRow);
  return {
    sheets,
    reading,
    headers: table.header,
    firstRows: table.rows
      .slice(0, previewRows)
      .map((cells, row) => shown({ row: table.lines[row], cells })),
    rowCount: table.rows.length,
    topLines: topLines.map(shown),
    guess: guessRecipe(
      table,
      titles.flatMap(({ cells }) => cells),
    ),
  };
}

function shown({ row, cells }: NumberedLine): NumberedLine {
  return {
    row,
    cells: cells.map((text) => (text.length > shownLength ? `${beginningOf(text)} …` : text)),
  };
}

/** Never half a character: what is no text would be refused as a whole. */
function beginningOf(text: string): string {
  const cut = text.slice(0, shownLength);
  return /[\uD800-\uDBFF]$/.test(cut) ? cut.slice(0, -1) : cut;
}
