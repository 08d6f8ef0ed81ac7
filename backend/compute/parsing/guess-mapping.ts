import { isMissing } from '../../panel-data/numbers/missing-cell';
import { type ColumnRole, headerWords as words } from './header-words';
import { decimalSigns } from './decimal-signs';
import type { IsCell } from './grid';
import { withoutMoney } from './money-hint';
import { parseNumber } from '../../panel-data/numbers/parse-number';
import { parseYear } from './parse-year';

/** The likely meaning of a file's columns; a role that none fits is absent. */
export interface MappingGuess {
  readonly company?: string;
  readonly year?: string;
  readonly marketValue?: string;
  readonly capex?: string;
  readonly bookEquity?: string;
  /** Further numeric columns. */
  readonly others: readonly string[];
}

/** Below so many numbers a column holds texts, whatever its header says. */
const leastNumbers = 0.2;

const numericRoles = new Set<ColumnRole>(['marketValue', 'capex', 'bookEquity']);

/**
 * Guesses which column is what by common header words and by what the first rows hold.
 *
 * @param headers  as the table has them.
 * @param sampleRows  some rows, one cell a header.
 * @param isNumber  whether a cell of theirs holds a number that is stored as one.
 */
export function guessMapping(
  headers: readonly string[],
  sampleRows: readonly (readonly string[])[],
  isNumber: IsCell = () => false,
): MappingGuess {
  const columns = headers.map((header, index) => describe(header, index, sampleRows, isNumber));
  const guess: Partial<Record<ColumnRole, string>> = {};
  const isFree = ({ header }: Column): boolean => !Object.values(guess).includes(header);
  for (const role of Object.keys(words) as ColumnRole[]) {
    const best = columns
      .filter((column) => isFree(column) && suits(role, column))
      .map((column) => ({ column, score: scoreOf(role, column) }))
      .filter(({ score }) => score > 0)
      .sort((left, right) => right.score - left.score)[0];
    const fallback = columns.find((column) => isFree(column) && isLikely(role, column));
    const chosen = best?.column ?? fallback;
    if (chosen !== undefined) guess[role] = chosen.header;
  }
  const others = columns
    .filter((column) => isFree(column) && column.isNumeric)
    .map(({ header }) => header);
  return { ...guess, others };
}

interface Column {
  readonly header: string;
  readonly words: string;
  /** The header's words without those of its money. */
  readonly subject: string;
  readonly isNumeric: boolean;
  /** Whether enough cells are numbers for a header to be believed that says so. */
  readonly hasNumbers: boolean;
  readonly isYear: boolean;
}

interface SampledCell {
  readonly text: string;
  readonly isStored: boolean;
}

function describe(
  header: string,
  index: number,
  rows: readonly (readonly string[])[],
  isNumber: IsCell,
): Column {
  const cells = rows
    .map((row, at): SampledCell => ({ text: row[index] ?? '', isStored: isNumber(at, index) }))
    .filter(({ text }) => !isMissing(text));
  const column = {
    rows: cells.map(({ text }) => [text]),
    isNumber: (at: number) => cells[at].isStored,
  };
  const [{ decimalSign }] = decimalSigns(column, [0]);
  const isYear = isMostly(cells, ({ text }) => {
    const year = parseYear(text);
    return year !== undefined && year >= 1800 && year <= 2200;
  });
  const isFigure = ({ text, isStored }: SampledCell): boolean =>
    isStored || parseNumber(text, decimalSign) !== undefined;
  return {
    header,
    words: wordsOf(header),
    subject: wordsOf(withoutMoney(header)),
    isNumeric: isMostly(cells, isFigure),
    hasNumbers: cells.some(isFigure) && shareOf(cells, isFigure) >= leastNumbers,
    isYear,
  };
}

/** A few slips, which the check names one by one, do not hide what a column is. */
function isMostly(cells: readonly SampledCell[], isFine: (cell: SampledCell) => boolean): boolean {
  return cells.length > 0 && shareOf(cells, isFine) >= 0.8;
}

function shareOf(cells: readonly SampledCell[], isFine: (cell: SampledCell) => boolean): number {
  return cells.filter(isFine).length / cells.length;
}

/** Lower case, words apart: `bookEquity_EUR` becomes `book equity eur`. */
function wordsOf(header: string): string {
  return header
    .replace(/(\p{Ll})(\p{Lu})/gu, '$1 $2')
    .toLowerCase()
    .replace(/['’]/gu, '')
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim();
}

/** A header that says nothing else is believed before its cells: those that are no numbers are for the check to name. */
function suits(role: ColumnRole, column: Column): boolean {
  if (numericRoles.has(role))
    return column.isNumeric || (column.hasNumbers && wholeWord(role, column) !== -1);
  return role === 'company' || column.isYear || !column.isNumeric;
}

/** A whole header is surer than a part of one, an earlier word than a later. */
function scoreOf(role: ColumnRole, column: Column): number {
  const list = words[role];
  const whole = wholeWord(role, column);
  if (whole !== -1) return 2 * list.length - whole;
  const part = list.findIndex((word) => ` ${column.words} `.includes(` ${word} `));
  return part === -1 ? 0 : list.length - part;
}

/** Which word of the role the header is, as a whole but for its money; −1 for none. */
function wholeWord(role: ColumnRole, { words: header, subject }: Column): number {
  const whole = new Set([compact(header), compact(subject)]);
  return words[role].findIndex((word) => whole.has(compact(word)));
}

/** `CapEx` and `cap ex` are the same word. */
function compact(text: string): string {
  return text.replaceAll(' ', '');
}

/** Without a telling header: the first column of texts names companies, one of year numbers is the year. */
function isLikely(role: ColumnRole, column: Column): boolean {
  if (role === 'company') return !column.isNumeric && !column.isYear;
  return role === 'year' && column.isYear;
}
