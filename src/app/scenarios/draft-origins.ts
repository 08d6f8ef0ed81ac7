import { DOCUMENT, Injectable, inject } from '@angular/core';
import { SessionStore } from '../api/session-store';

const prefix = 'kinvale.draft-origin.';

/**
 * Which version of a scenario one's unsaved changes began with, kept in this browser: with it a page that comes back
 * tells whether somebody else saved a version meanwhile.
 */
@Injectable({ providedIn: 'root' })
export class DraftOrigins {
  readonly #storage = inject(DOCUMENT).defaultView?.localStorage;
  readonly #sessions = inject(SessionStore);

  /** Null where this browser keeps none. */
  read(scenarioId: string): number | null {
    const kept = Number(this.#storage?.getItem(this.#key(scenarioId)) ?? NaN);
    return Number.isInteger(kept) ? kept : null;
  }

  keep(scenarioId: string, version: number): void {
    this.#storage?.setItem(this.#key(scenarioId), String(version));
  }

  forget(scenarioId: string): void {
    this.#storage?.removeItem(this.#key(scenarioId));
  }

  #key(scenarioId: string): string {
    return `${prefix}${this.#sessions.session()?.person.id ?? ''}.${scenarioId}`;
  }
}
