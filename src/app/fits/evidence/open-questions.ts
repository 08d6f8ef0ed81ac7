import { DOCUMENT } from '@angular/common';
import { Injectable, inject, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { SessionStore } from '../../api/session-store';
import { questions } from './questions';

const key = 'kinvale.open-questions';

/** Which questions of the evidence are open, on every fit alike, kept until the browser's tab or the session ends. */
@Injectable({ providedIn: 'root' })
export class OpenQuestions {
  readonly #storage = inject(DOCUMENT).defaultView?.sessionStorage;
  readonly #open = signal(this.#kept());

  constructor() {
    inject(SessionStore)
      .ended.pipe(takeUntilDestroyed())
      .subscribe(() => {
        this.#keep(new Set());
      });
  }

  isOpen(id: string): boolean {
    return this.#open().has(id);
  }

  open(...ids: readonly string[]): void {
    this.#keep(new Set([...this.#open(), ...ids]));
  }

  close(...ids: readonly string[]): void {
    this.#keep(new Set([...this.#open()].filter((id) => !ids.includes(id))));
  }

  #keep(open: ReadonlySet<string>): void {
    this.#open.set(open);
    this.#storage?.setItem(key, [...open].join(' '));
  }

  #kept(): ReadonlySet<string> {
    const ids = this.#storage?.getItem(key)?.split(' ') ?? [];
    return new Set(
      Object.values(questions)
        .map(({ id }) => id)
        .filter((id) => ids.includes(id)),
    );
  }
}
