import { type Signal, type WritableSignal, computed, signal } from '@angular/core';

/** A year chosen among those there are; the usual one until the person chooses, and when theirs is gone. */
export class ChosenYear {
  readonly #chosen: WritableSignal<number | null> = signal(null);
  readonly year: Signal<number | null>;

  /** @param usual  the year to begin with; null where there is none. */
  constructor(
    readonly years: Signal<readonly number[]>,
    usual: () => number | null,
  ) {
    this.year = computed(() => {
      const chosen = this.#chosen();
      return chosen !== null && years().includes(chosen) ? chosen : usual();
    });
  }

  choose(year: number): void {
    this.#chosen.set(year);
  }
}
