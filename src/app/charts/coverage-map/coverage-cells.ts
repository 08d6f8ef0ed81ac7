import type { CoverageMapLayout } from '@figures';

/** The map's marks as a handful of paths: thousands of elements would make scrolling slow. */
export interface CoverageMarks {
  readonly ownComplete: string;
  readonly complete: string;
  readonly ownSome: string;
  readonly some: string;
  readonly none: string;
  readonly flagged: string;
}

/** A full square where all is there, its lower half where some is missing, a dot where nothing is. */
export function coverageCells(layout: CoverageMapLayout): CoverageMarks {
  const marks = { ownComplete: '', complete: '', ownSome: '', some: '', none: '', flagged: '' };
  const half = layout.markSize / 2;
  for (const row of layout.rows)
    for (const { x, state, flagged } of row.cells) {
      const [left, top] = [x - half, row.y - half];
      const square = `M${left},${top}h${2 * half}v${2 * half}h${-2 * half}Z`;
      const triangle = `M${left},${top}v${2 * half}h${2 * half}Z`;
      if (state === 'complete') marks[row.isOwn ? 'ownComplete' : 'complete'] += square;
      else if (state === 'some') marks[row.isOwn ? 'ownSome' : 'some'] += triangle;
      else marks.none += `M${x - 2},${row.y}h4`;
      if (flagged.length > 0) marks.flagged += `M${x + half - 6},${row.y - half - 3}h10l-5,9Z`;
    }
  return marks;
}
