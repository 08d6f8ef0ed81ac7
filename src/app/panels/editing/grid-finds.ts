import { type Signal, computed, linkedSignal, signal } from '@angular/core';
import type { GridPlace } from './cell-block';
import type { ShownGrid } from './copy-cells';
import { findCells } from './find-cells';

/** What is looked for in a grid, where it is found, and at which of the finds one is. */
export class GridFinds {
  readonly text = signal('');
  readonly found: Signal<readonly GridPlace[]>;
  /** Counted from 1; 0 before the first. */
  readonly at: Signal<number>;
  readonly #at;

  /**
   * @param shown  follows what the grid shows.
   * @param digits  digits after the point by column of the panel.
   */
  constructor(shown: () => ShownGrid, digits: () => readonly number[]) {
    this.found = computed(() =>
      this.text() === '' ? [] : findCells(this.text(), shown(), digits()),
    );
    this.#at = linkedSignal({ source: this.found, computation: () => 0 });
    this.at = this.#at.asReadonly();
  }

  /** @returns the find to go to, the first after the last; undefined where there is none. */
  step(way: 'next' | 'previous'): GridPlace | undefined {
    const [found, at] = [this.found(), this.#at()];
    if (found.length === 0) return undefined;
    const next = way === 'next' ? (at % found.length) + 1 : at <= 1 ? found.length : at - 1;
    this.#at.set(next);
    return found[next - 1];
  }
}
