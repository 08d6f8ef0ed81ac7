import { DestroyRef, Injectable, computed, inject, signal } from '@angular/core';
import type { PanelColumn } from '@contract';
import type { CoverageWindow, Flag } from '@panel-data';
import { type Subscription, switchMap, timer } from 'rxjs';
import { cellKey, rowKey } from '../editing/panel-edits';
import type { CellFlags } from '../editing/row-filter';
import type { PanelRow } from '../panel-rows';
import { DismissalsStore } from './dismissals-store';
import { type SortedFlags, sortedFlags } from './dismissed-flags';
import { findInPanel } from './flag-finder';
import type { FoundInPanel } from './found-in-panel';
import { modelColumns, panelCells } from './panel-cells';

const settledMs = 120;

/** What the rules find in the rows that are on the screen, saved or not, less what was found to be right. */
@Injectable()
export class FlagsStore {
  readonly #dismissals = inject(DismissalsStore);
  readonly #found = signal<FoundInPanel | null>(null);
  #running: Subscription | null = null;

  /** Null until the panel has been looked through; of the rows before while it is looked through again. */
  readonly flags = computed((): SortedFlags | null => {
    const found = this.#found();
    return found === null ? null : sortedFlags(found.flags, this.#dismissals.dismissals());
  });
  /** Cells with a figure that stands out; what is missing is counted elsewhere. */
  readonly figuresToLookAt = computed(() => {
    let count = 0;
    for (const list of this.byCell().values())
      if (list.some(({ column, facts }) => column !== null && facts.code !== 'missing')) count += 1;
    return count;
  });
  readonly window = computed(() => this.#found()?.window ?? null);
  readonly #only = signal<CoverageWindow | null>(null);
  /** The window whose companies and years alone are shown; null where all are. */
  readonly only = this.#only.asReadonly();
  /** The flags to look at, by the cell that has them; those of a whole row that is there by its row. */
  readonly byCell = computed((): CellFlags => {
    const cells = new Map<string, Flag[]>();
    for (const flag of this.flags()?.open ?? []) {
      const { company, year, column, facts } = flag;
      if (facts.code === 'year-gap') continue;
      const key = column === null ? rowKey(flag) : cellKey({ company, year, column });
      const list = cells.get(key);
      if (list === undefined) cells.set(key, [flag]);
      else list.push(flag);
    }
    return cells;
  });

  constructor() {
    inject(DestroyRef).onDestroy(() => this.#running?.unsubscribe());
  }

  /** Another panel: nothing is known of it. */
  forget(): void {
    this.#running?.unsubscribe();
    this.#found.set(null);
    this.#only.set(null);
  }

  /** Leaves out all but the largest fully covered window, as it is now. */
  showOnlyWindow(): void {
    this.#only.set(this.window());
  }

  showAll(): void {
    this.#only.set(null);
  }

  /** Begins after what is on the screen has been drawn, and when nothing more is typed. */
  lookThrough(
    rows: readonly PanelRow[],
    columns: readonly PanelColumn[],
    ownCompany: string | null,
  ): void {
    this.#running?.unsubscribe();
    this.#running = timer(settledMs)
      .pipe(
        switchMap(() => {
          const cells = panelCells(rows, columns);
          return findInPanel({ cells, columns: modelColumns(columns), ownCompany });
        }),
      )
      .subscribe((found) => {
        this.#found.set(found);
      });
  }
}
