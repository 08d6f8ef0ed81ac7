/** Cells of a block, row by row, as spreadsheets put them on the clipboard: tabs between cells, a line a row. */
export function blockText(rows: readonly (readonly string[])[]): string {
  return rows.map((cells) => cells.map(quoted).join('\t')).join('\n');
}

/**
 * Reads a block from the clipboard. A cell in double quotes may hold tabs and line ends, doubled quotes standing for
 * one; the line end after the last row is no row of its own.
 */
export function readBlockText(text: string): readonly (readonly string[])[] {
  const rows: string[][] = [[]];
  let cell = '';
  let isQuoted = false;
  const endCell = (): void => {
    rows[rows.length - 1].push(cell);
    cell = '';
  };
  const plain = text.replace(/\r\n?/g, '\n');
  for (let at = 0; at < plain.length; at++) {
    const sign = plain[at];
    if (isQuoted) {
      if (sign !== '"') cell += sign;
      else if (plain[at + 1] === '"') {
        cell += '"';
        at += 1;
      } else isQuoted = false;
    } else if (sign === '"' && cell === '') isQuoted = true;
    else if (sign === '\t') endCell();
    else if (sign === '\n') {
      endCell();
      if (at < plain.length - 1) rows.push([]);
    } else cell += sign;
  }
  if (!plain.endsWith('\n') || isQuoted) endCell();
  return rows;
}

function quoted(cell: string): string {
  return /["\t\n\r]/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell;
}
