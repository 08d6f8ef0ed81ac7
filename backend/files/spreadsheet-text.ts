/** How a text begins that a spreadsheet would take for a formula, or that already stands behind an apostrophe. */
const formulaStart = /^'*[=+\-@\t\r\n\0＝＋－＠]/u;

/**
 * A text as a cell that no spreadsheet computes: one that begins like a formula gets an apostrophe before it. Taking one
 * apostrophe away from what then matches the same pattern gives the text back. Numbers never pass through here.
 */
export function spreadsheetText(text: string): string {
  return formulaStart.test(text) ? `'${text}` : text;
}
