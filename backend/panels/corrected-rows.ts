import type { PanelRow, RowKey } from '../../db/repositories/panel-copies-repository';
import { type FieldError, Invalid } from '../errors/app-error';
import { inSlices } from './in-slices';

/** One cell as it should be. */
export interface CellCorrection extends RowKey {
  /** Position among the version's columns. */
  readonly column: number;
  readonly value: number | null;
  readonly reason: string;
  readonly source: string;
}

/** A set of corrections of one panel version. */
export interface Corrections {
  readonly note: string;
  readonly cells: readonly CellCorrection[];
  readonly addedRows: readonly RowKey[];
  readonly removedRows: readonly RowKey[];
}

/** The rows that a set of corrections touches, as they should be. */
export interface CorrectedRows {
  readonly changed: readonly PanelRow[];
  readonly added: readonly PanelRow[];
  readonly removed: readonly RowKey[];
}

const mostErrors = 100;

/** Every row that a set of corrections names, once. */
export function rowsNamed({ cells, addedRows, removedRows }: Corrections): readonly RowKey[] {
  const named = new Map<string, RowKey>();
  for (const { company, year } of [...cells, ...addedRows, ...removedRows])
    named.set(keyOf({ company, year }), { company, year });
  return [...named.values()];
}

/**
 * Applies corrections to the rows that they name, in slices: 50,000 at once kept others waiting for 300 ms.
 *
 * @param columns  headers of the version.
 * @param held  the named rows that the version has.
 * @throws {Invalid} naming each row that is not as said, and each cell that is named twice, changes nothing, or stands
 *   outside the panel.
 */
export async function correctedRows(
  columns: readonly string[],
  held: readonly PanelRow[],
  { cells, addedRows, removedRows }: Corrections,
): Promise<CorrectedRows> {
  const sheet = new CorrectionSheet(columns);
  await inSlices(held, (row) => {
    sheet.hold(row);
  });
  await inSlices(removedRows, (key, index) => {
    sheet.remove(key, `/removedRows/${index}`);
  });
  await inSlices(addedRows, (key, index) => {
    sheet.add(key, `/addedRows/${index}`);
  });
  await inSlices(cells, (cell, index) => {
    sheet.correct(cell, `/cells/${index}`);
  });
  if (cells.length + addedRows.length + removedRows.length === 0)
    throw new Invalid('Expected at least one cell, one added row or one removed row; found none.');
  return sheet.rows();
}

class CorrectionSheet {
  readonly #held = new Map<string, PanelRow>();
  readonly #removed = new Map<string, RowKey>();
  readonly #added = new Map<string, DraftRow>();
  readonly #changed = new Map<string, DraftRow>();
  readonly #errors: FieldError[] = [];

  constructor(private readonly columns: readonly string[]) {}

  /** A row that the version has; all of them before anything is corrected. */
  hold(row: PanelRow): void {
    this.#held.set(keyOf(row), row);
  }

  remove(key: RowKey, pointer: string): void {
    const place = keyOf(key);
    if (this.#removed.has(place)) this.#refuse(pointer, `${nameOf(key)} is removed twice`);
    else if (!this.#held.has(place)) this.#refuse(pointer, `the panel has no row ${nameOf(key)}`);
    this.#removed.set(place, key);
  }

  add({ company, year }: RowKey, pointer: string): void {
    const key = { company, year };
    const place = keyOf(key);
    if (this.#held.has(place)) {
      this.#refuse(pointer, `the panel has a row ${nameOf(key)} already`);
      return;
    }
    if (this.#added.has(place)) this.#refuse(pointer, `${nameOf(key)} is added twice`);
    this.#added.set(place, draftOf({ ...key, cells: this.columns.map(() => null) }));
  }

  correct({ company, year, column, value }: CellCorrection, pointer: string): void {
    const key = { company, year };
    if (column >= this.columns.length) {
      const found = `expected one of ${this.columns.length} columns, counted from 0; found ${column}`;
      this.#refuse(`${pointer}/column`, found);
      return;
    }
    const cell = (): string => `“${this.columns[column]}” of ${nameOf(key)}`;
    const place = keyOf(key);
    const row = this.#rowToWrite(place);
    if (row === undefined) {
      const why = this.#removed.has(place) ? 'its row is removed' : 'the panel has no such row';
      this.#refuse(pointer, `${cell()}: ${why}`);
      return;
    }
    if (row.corrected.has(column)) this.#refuse(pointer, `${cell()} is named twice`);
    else if (row.cells[column] === value)
      this.#refuse(`${pointer}/value`, `${cell()} is ${value ?? 'missing'} already`);
    row.corrected.add(column);
    row.cells[column] = value;
  }

  /** @throws {Invalid} */
  rows(): CorrectedRows {
    if (this.#errors.length > 0)
      throw new Invalid('The corrections do not fit the panel.', this.#errors.slice(0, mostErrors));
    return {
      changed: [...this.#changed.values()],
      added: [...this.#added.values()],
      removed: [...this.#removed.values()],
    };
  }

  #rowToWrite(place: string): DraftRow | undefined {
    if (this.#removed.has(place)) return undefined;
    const begun = this.#added.get(place) ?? this.#changed.get(place);
    const held = this.#held.get(place);
    if (begun !== undefined || held === undefined) return begun;
    const row = draftOf(held);
    this.#changed.set(place, row);
    return row;
  }

  #refuse(pointer: string, detail: string): void {
    this.#errors.push({ pointer, detail });
  }
}

interface DraftRow extends RowKey {
  readonly cells: (number | null)[];
  /** Positions of the columns that are corrected. */
  readonly corrected: Set<number>;
}

function draftOf({ company, year, cells }: PanelRow): DraftRow {
  return { company, year, cells: [...cells], corrected: new Set() };
}

function keyOf({ company, year }: RowKey): string {
  return `${year} ${company}`;
}

function nameOf({ company, year }: RowKey): string {
  return `${company} ${year}`;
}
