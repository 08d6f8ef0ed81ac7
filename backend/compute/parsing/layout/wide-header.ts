import type { Grid } from '../grid';
import { uniqueHeader } from '../unique-header';
import { type YearLabel, yearLabel } from './year-label';

export interface PlainColumn {
  readonly column: number;
  /** Unlike any other header of the sheet. */
  readonly header: string;
}

export interface YearColumn extends PlainColumn {
  readonly label: YearLabel;
}

/** The headers of a sheet with years in columns. */
export interface WideHeader {
  /** Columns without a year: the company and what describes it. */
  readonly plain: readonly PlainColumn[];
  readonly years: readonly YearColumn[];
}

/**
 * Reads the headers of a sheet with years in columns. Where a header is a year alone, the row above may name the
 * variable of its block, or the other way round; a block's name stands at its first column and holds up to the next.
 */
export function wideHeader(grid: Grid, headerIndex: number): WideHeader {
  const own = grid.rows[headerIndex];
  const above = headerIndex === 0 ? [] : grid.rows[headerIndex - 1];
  const below = grid.rows.slice(headerIndex + 1);
  const width = below.reduce((widest, cells) => Math.max(widest, cells.length), own.length);
  const blocks = blocksOver(own, above, width);
  const labels = Array.from({ length: width }, (_, column) =>
    labelOf((own[column] ?? '').trim(), blocks[column]),
  );
  const repeated = yearsAboveThatRepeat(labels);
  const columns = labels.map((found, column) => {
    const label = found?.isYearAbove === true && !repeated.has(found.variable) ? undefined : found;
    const text = (own[column] ?? '').trim();
    return { column, label, text: label?.header ?? (text || (above[column] ?? '').trim()) };
  });
  const used = columns.filter(
    ({ text, column }) => text !== '' || below.some((cells) => (cells[column] ?? '').trim() !== ''),
  );
  const { header } = uniqueHeader(columns.map(({ text }) => text));
  const named = used.map(({ column, label }) => ({ column, header: header[column], label }));
  return {
    plain: named
      .filter(({ label }) => label === undefined)
      .map(({ column, header: name }) => ({ column, header: name })),
    years: named.flatMap(({ column, header: name, label }) =>
      label === undefined ? [] : [{ column, header: name, label }],
    ),
  };
}

interface FoundLabel extends YearLabel {
  readonly header: string;
  readonly isYearAbove: boolean;
}

function labelOf(text: string, block: string): FoundLabel | undefined {
  const label = yearLabel(text);
  const blockLabel = yearLabel(block);
  if (label !== undefined) {
    const isNamed = label.variable !== '' || block === '' || blockLabel?.variable === '';
    return {
      ...label,
      variable: isNamed ? label.variable : block,
      header: isNamed ? text : `${block} ${text}`,
      isYearAbove: false,
    };
  }
  if (text === '' || blockLabel?.variable !== '') return undefined;
  return { ...blockLabel, variable: text, header: `${text} ${block}`, isYearAbove: true };
}

/** A column right of the last block has its year above by accident: its own header comes once. */
function yearsAboveThatRepeat(labels: readonly (FoundLabel | undefined)[]): ReadonlySet<string> {
  const once = new Set<string>();
  const repeated = new Set<string>();
  for (const label of labels) {
    if (label?.isYearAbove !== true) continue;
    if (once.has(label.variable)) repeated.add(label.variable);
    once.add(label.variable);
  }
  return repeated;
}

/** Names of blocks, filled forward. A title above a column without a year names none. */
function blocksOver(
  own: readonly string[],
  above: readonly string[],
  width: number,
): readonly string[] {
  let block = '';
  return Array.from({ length: width }, (_, column) => {
    const text = (above[column] ?? '').trim();
    if (text === '') return block;
    const hasYear = [own[column] ?? '', text].some((it) => yearLabel(it)?.variable === '');
    block = hasYear ? text : '';
    return block;
  });
}
