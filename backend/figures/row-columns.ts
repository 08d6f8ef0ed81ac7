import { max } from 'd3';
import type { PlacedText, PlacedTick, Plot } from './figure-types';
import { figuresWidth, wordsWidth } from './text-width';

/** A column of figures at the right of a chart of rows. */
export interface FigureColumn {
  /** Stands over the column, in words; empty for none. */
  readonly label: string;
  /** One a row. */
  readonly texts: readonly string[];
}

/** Where names, marks and figures of a chart of rows go, CSS pixels from the left. */
export interface RowColumns {
  readonly nameWidth: number;
  /** Right edge of the names. */
  readonly nameX: number;
  readonly left: number;
  readonly right: number;
  /** Right edge of each column; null where there is no room for it. */
  readonly columnX: readonly (number | null)[];
}

export const nameSize = 13;
const leastPlot = 220;
const gap = 20;
const edge = 8;

/** Names at the left, marks in the middle, figures at the right; as room gets short the last column goes first. */
export function rowColumns(
  names: readonly string[],
  columns: readonly FigureColumn[],
  width: number,
): RowColumns {
  const longest = max(names, (name) => wordsWidth(name, nameSize)) ?? 0;
  const nameWidth = Math.min(longest, width * 0.3);
  const left = nameWidth + gap;
  const widths = columns.map(({ label, texts }) =>
    Math.max(wordsWidth(label), max(texts, (text) => figuresWidth(text)) ?? 0),
  );
  const taken = (count: number) =>
    widths.slice(0, count).reduce((sum, column) => sum + column + gap, edge);
  let kept = widths.length;
  while (kept > 0 && width - left - taken(kept) < leastPlot) kept -= 1;

  const columnX = widths.map((_, place) =>
    place < kept ? width - edge - (taken(kept) - taken(place + 1)) : null,
  );
  return {
    nameWidth,
    nameX: nameWidth + edge,
    left,
    right: Math.max(left + 40, kept === 0 ? width - 12 : width - taken(kept)),
    columnX,
  };
}

/** The words over the columns that there is room for. */
export function columnHeads(
  columns: readonly FigureColumn[],
  { columnX }: RowColumns,
  y: number,
): PlacedText[] {
  return columns.flatMap(({ label }, place) => {
    const x = columnX[place];
    return x === null || label === '' ? [] : [{ text: label, x, y, anchor: 'end' as const }];
  });
}

/** Rows get lower as there are more, never lower than a line of words. */
export function heightOfNamedRows(count: number): number {
  if (count <= 16) return 28;
  return count <= 24 ? 24 : 20;
}

/** How many marks a level axis has room for, three at least. */
export function ticksFor({ left, right }: Pick<Plot, 'left' | 'right'>): number {
  return Math.max(3, Math.round((right - left) / 110));
}

/** The marks whose labels do not run into the words over the columns. */
export function ticksBesideHeads(
  ticks: readonly PlacedTick[],
  heads: readonly PlacedText[],
): PlacedTick[] {
  const edges = heads.map(({ text, x }) => x - wordsWidth(text));
  const most = Math.min(...edges, Infinity) - edge;
  return ticks.filter(({ position, label }) => position + figuresWidth(label) / 2 <= most);
}
