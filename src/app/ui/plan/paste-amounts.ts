import { readBlockText } from '../block-text';
import { readFigures } from '../read-figures';
import type { PlannedAmount } from './change-asked';
import { mostYears } from './change-plan';

export interface PasteGround {
  readonly firstYear: number;
  /** How many regressors the plan has. */
  readonly regressors: number;
  /** Whether only amounts above zero can be read, as where logs are taken of them. */
  readonly isAboveZero: boolean;
  /** Into the panel's unit. */
  readonly toPanel: (shown: number, regressor: number) => number;
}

/** Where the pasted block's first cell goes. */
export interface PastePlace {
  readonly year: number;
  readonly regressor: number;
}

/** A pasted cell that is no amount, and why; the plan keeps what it had. */
export interface BadCell {
  readonly year: number;
  readonly regressor: number;
  readonly text: string;
  readonly reason: string;
}

export interface PastedAmounts {
  readonly amounts: readonly PlannedAmount[];
  readonly bad: readonly BadCell[];
  /** Cells beyond the last year or the last regressor that a plan has room for. */
  readonly leftOut: number;
  /** Whether the block had its years from left to right, as spreadsheets often do. */
  readonly isTurned: boolean;
}

/**
 * Reads a block from a spreadsheet into planned amounts, years down and regressors across. A block that is wider than
 * the plan has regressors, and no higher, has its years across and is turned.
 */
export function pastedAmounts(text: string, at: PastePlace, ground: PasteGround): PastedAmounts {
  const block = readBlockText(text);
  const width = Math.max(...block.map((cells) => cells.length));
  const room = ground.regressors - at.regressor;
  const isTurned = width > room && block.length <= room;
  const cells = isTurned ? turned(block, width) : block;
  const figures = readFigures(cells);
  const amounts: PlannedAmount[] = [];
  const bad: BadCell[] = [];
  let leftOut = 0;
  cells.forEach((row, down) => {
    row.forEach((cell, across) => {
      const place = { year: at.year + down, regressor: at.regressor + across };
      if (place.regressor >= ground.regressors || place.year >= ground.firstYear + mostYears) {
        leftOut += 1;
        return;
      }
      const reason = badReason(figures[down][across], ground);
      const shown = figures[down][across];
      if (reason === undefined && typeof shown === 'number')
        amounts.push({ ...place, value: ground.toPanel(shown, place.regressor) });
      else if (reason !== undefined) bad.push({ ...place, text: cell.trim(), reason });
    });
  });
  return { amounts, bad, leftOut, isTurned };
}

function badReason(
  figure: number | null | undefined,
  { isAboveZero }: PasteGround,
): string | undefined {
  if (figure === null) return 'a plan needs an amount';
  if (figure === undefined) return 'expected a number';
  return isAboveZero && !(figure > 0)
    ? 'expected an amount above zero, for the fit reads logs'
    : undefined;
}

function turned(block: readonly (readonly string[])[], width: number): string[][] {
  return Array.from({ length: width }, (_, across) => block.map((row) => row[across] ?? ''));
}
