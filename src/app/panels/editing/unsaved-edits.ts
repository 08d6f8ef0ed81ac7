import { Injectable, inject, signal } from '@angular/core';
import { Confirm } from '../../ui/confirm';

/** Whether the panel that is shown has edits that are not saved; asked before its page is left. */
@Injectable({ providedIn: 'root' })
export class UnsavedEdits {
  readonly #confirm = inject(Confirm);
  readonly #words = signal('');

  /** @param words  what is not saved, as `12 cells and 1 row`; empty for nothing. */
  show(words: string): void {
    this.#words.set(words);
  }

  /** Asks before the page is left. */
  async mayLeave(): Promise<boolean> {
    if (this.#words() === '') return true;
    return this.#confirm.ask({
      title: 'Leave without saving?',
      detail: `${this.#words()} changed and not saved as a version. They come back when this version is opened again in this tab.`,
      action: 'Leave without saving',
    });
  }

  /** Has the browser ask before the tab is closed. */
  holdBack(event: Event): void {
    if (this.#words() !== '') event.preventDefault();
  }
}
