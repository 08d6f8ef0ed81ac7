import { DOCUMENT, Injectable, inject } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import * as z from 'zod';
import { SessionStore } from '../../api/session-store';
import { type PanelEdits, cellKey, countEdits, rowKey } from './panel-edits';

const rowPlace = z.object({ company: z.string(), year: z.number().int() });
const KeptText = z.object({
  personId: z.string(),
  cells: z.array(
    z.object({
      place: rowPlace.extend({ column: z.number().int() }),
      value: z.number().nullable(),
    }),
  ),
  added: z.array(rowPlace),
  removed: z.array(rowPlace),
});

const prefix = 'kv-panel-edits:';

/**
 * Edits that are not saved, by panel version: they outlive a reload of the tab, and a session that ends for as long as
 * the page stays open. Nothing is left in the browser's storage after signing out, and nobody else is shown them.
 */
@Injectable({ providedIn: 'root' })
export class KeptEdits {
  readonly #sessions = inject(SessionStore);
  readonly #storage = inject(DOCUMENT).defaultView?.sessionStorage;
  readonly #texts = new Map<string, string>();

  constructor() {
    this.#sessions.ended.pipe(takeUntilDestroyed()).subscribe(() => {
      const keys = Object.keys(this.#storage ?? {}).filter((key) => key.startsWith(prefix));
      for (const key of keys) this.#storage?.removeItem(key);
    });
  }

  /** @returns whether the edits would outlive a reload: the browser may have no room for very many. */
  keep(panelVersionId: string, edits: PanelEdits): boolean {
    const key = prefix + panelVersionId;
    if (countEdits(edits) === 0) {
      this.#texts.delete(key);
      this.#storage?.removeItem(key);
      return true;
    }
    const text = JSON.stringify({
      personId: this.#personId,
      cells: [...edits.cells.values()],
      added: [...edits.added.values()],
      removed: [...edits.removed.values()],
    });
    this.#texts.set(key, text);
    try {
      this.#storage?.setItem(key, text);
      return true;
    } catch (error) {
      if (!(error instanceof DOMException) || error.name !== 'QuotaExceededError') throw error;
      this.#storage?.removeItem(key);
      return false;
    }
  }

  recall(panelVersionId: string): PanelEdits | null {
    const key = prefix + panelVersionId;
    const text = this.#texts.get(key) ?? this.#storage?.getItem(key);
    const kept = KeptText.safeParse(text == null ? null : readJson(text));
    if (!kept.success || kept.data.personId !== this.#personId) return null;
    const { cells, added, removed } = kept.data;
    return {
      cells: new Map(cells.map((change) => [cellKey(change.place), change])),
      added: new Map(added.map((row) => [rowKey(row), row])),
      removed: new Map(removed.map((row) => [rowKey(row), row])),
    };
  }

  get #personId(): string {
    return this.#sessions.person()?.id ?? '';
  }
}

function readJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (error) {
    if (error instanceof SyntaxError) return null;
    throw error;
  }
}
