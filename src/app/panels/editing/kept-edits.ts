import { Injectable, inject } from '@angular/core';
import * as z from 'zod';
import { SessionStore } from '../../api/session-store';
import { KeptTexts } from './kept-texts';
import { type PanelEdits, cellKey, countEdits, rowKey } from './panel-edits';
import { type SaveDraft, isEmptyDraft } from './save-lines';

const rowPlace = z.object({ company: z.string(), year: z.number().int() });
const KeptCells = z.object({
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
const KeptDraft = z.object({
  personId: z.string(),
  note: z.string(),
  common: z.object({ reason: z.string(), source: z.string() }),
  /** By cell key. */
  own: z.array(
    z.tuple([
      z.string(),
      z.object({ reason: z.string().optional(), source: z.string().optional() }),
    ]),
  ),
});

/** Edits that are not saved and what is said of them, by panel version; nobody else is shown them. */
@Injectable({ providedIn: 'root' })
export class KeptEdits {
  readonly #sessions = inject(SessionStore);
  readonly #texts = inject(KeptTexts);

  /** @returns whether the edits would outlive a reload. */
  keep(panelVersionId: string, edits: PanelEdits): boolean {
    if (countEdits(edits) === 0) {
      this.#texts.remove(`edits:${panelVersionId}`);
      return true;
    }
    return this.#texts.put(`edits:${panelVersionId}`, {
      personId: this.#personId,
      cells: [...edits.cells.values()],
      added: [...edits.added.values()],
      removed: [...edits.removed.values()],
    });
  }

  recall(panelVersionId: string): PanelEdits | null {
    const kept = KeptCells.safeParse(this.#texts.read(`edits:${panelVersionId}`));
    if (!kept.success || kept.data.personId !== this.#personId) return null;
    const { cells, added, removed } = kept.data;
    return {
      cells: new Map(cells.map((change) => [cellKey(change.place), change])),
      added: new Map(added.map((row) => [rowKey(row), row])),
      removed: new Map(removed.map((row) => [rowKey(row), row])),
    };
  }

  /** Apart from the edits: it changes with every letter, and they may be many. @returns as `keep` does. */
  keepDraft(panelVersionId: string, draft: SaveDraft): boolean {
    if (isEmptyDraft(draft)) {
      this.#texts.remove(`draft:${panelVersionId}`);
      return true;
    }
    const { note, common, own } = draft;
    const kept = { personId: this.#personId, note, common, own: [...own] };
    return this.#texts.put(`draft:${panelVersionId}`, kept);
  }

  recallDraft(panelVersionId: string): SaveDraft | null {
    const kept = KeptDraft.safeParse(this.#texts.read(`draft:${panelVersionId}`));
    if (!kept.success || kept.data.personId !== this.#personId) return null;
    const { note, common, own } = kept.data;
    return { note, common, own: new Map(own) };
  }

  get #personId(): string {
    return this.#sessions.person()?.id ?? '';
  }
}
