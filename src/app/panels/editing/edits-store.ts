import { Injectable, computed, inject, signal } from '@angular/core';
import type { PanelVersionReply, SaveCorrections } from '@contract';
import { firstValueFrom } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../../api/api-problem';
import { PanelsApi } from '../../api/panels-api';
import { counted } from '../../ui/phrases';
import { panelRows } from '../panel-rows';
import { type EditHistory, noHistory, redo, step, undo } from './edit-history';
import { editsWords } from './edit-words';
import { KeptEdits } from './kept-edits';
import {
  type CellChange,
  type PanelEdits,
  type RowPlace,
  addRow,
  countEdits,
  editedRows,
  noEdits,
  removeRows,
  savedRows,
  setCells,
} from './panel-edits';

/** As many corrections as one version takes. */
export const mostCells = 50_000;
export const mostRows = 5_000;

export type SaveOutcome =
  | { readonly kind: 'saved'; readonly panelVersionId: string }
  /** Somebody saved a newer version meanwhile. */
  | { readonly kind: 'stale'; readonly latestId: string; readonly detail: string }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

/** The edits of one panel version that are not saved, with the way back and forth. */
@Injectable()
export class EditsStore {
  readonly #panels = inject(PanelsApi);
  readonly #kept = inject(KeptEdits);
  readonly #panel = signal<PanelVersionReply | null>(null);
  readonly #history = signal<EditHistory>(noHistory);
  readonly #isKept = signal(true);
  readonly #restored = signal('');

  readonly savedRows = computed(() => {
    const panel = this.#panel();
    return panel === null ? [] : panelRows(panel);
  });
  readonly #saved = computed(() => savedRows(this.savedRows()));
  /** What the version holds, by row key. */
  readonly saved = this.#saved;
  readonly edits = computed(() => this.#history().now);
  readonly count = computed(() => countEdits(this.edits()));
  /** The version's rows as they would be saved. */
  readonly rows = computed(() =>
    editedRows(this.savedRows(), this.#saved(), this.#panel()?.columns.length ?? 0, this.edits()),
  );
  /** What Undo would take back, and Redo would do again; empty where there is nothing. */
  readonly undoWords = computed(() => this.#history().past.at(-1)?.words ?? '');
  readonly redoWords = computed(() => this.#history().future.at(-1)?.words ?? '');
  /** Whether the edits would outlive a reload. */
  readonly isKept = this.#isKept.asReadonly();
  /** What came back from before the page was loaded again, as `12 cells and 1 row`; empty where nothing did. */
  readonly restored = this.#restored.asReadonly();

  /** Begins with a version, and with what was not saved of it before. */
  open(panel: PanelVersionReply): void {
    this.#panel.set(panel);
    const kept = this.#kept.recall(panel.version.id);
    const edits = kept === null ? noEdits : this.#stillFitting(kept);
    this.#history.set({ ...noHistory, now: edits });
    this.#restored.set(editsWords(edits));
  }

  dismissRestored(): void {
    this.#restored.set('');
  }

  /** @param done  what is done, as `pasted`. @returns how many cells differ from before. */
  change(changes: readonly CellChange[], done: string): number {
    const now = setCells(this.edits(), this.#saved(), changes);
    const differing = countDiffering(this.edits(), now);
    if (differing === 0) return 0;
    this.#step(now, `${counted(differing, 'cell')} ${done}`);
    return differing;
  }

  addRow(row: RowPlace): void {
    this.#step(addRow(this.edits(), this.#saved(), row), '1 row added');
  }

  removeRows(rows: readonly RowPlace[]): void {
    const now = removeRows(this.edits(), this.#saved(), rows);
    this.#step(now, `${counted(rows.length, 'row')} removed`);
  }

  hasRow(row: RowPlace): boolean {
    return this.rows().some(({ company, year }) => company === row.company && year === row.year);
  }

  undo(): void {
    this.#show(undo(this.#history()));
  }

  redo(): void {
    this.#show(redo(this.#history()));
  }

  /** Back to the version as it is saved; can be undone. */
  discard(): void {
    this.#step(noEdits, `${editsWords(this.edits())} discarded`);
  }

  /** Nothing is lost where it fails. */
  async save(body: SaveCorrections): Promise<SaveOutcome> {
    const panel = this.#panel();
    if (panel === null) throw new Error('expected a panel version to be open');
    try {
      const saved = await firstValueFrom(this.#panels.saveCorrections(panel.version.id, body));
      this.#show(noHistory);
      return { kind: 'saved', panelVersionId: saved.id };
    } catch (error) {
      const problem = toApiProblem(error);
      const { latestId } = problem.problem;
      return problem.slug === 'stale-version' && typeof latestId === 'string'
        ? { kind: 'stale', latestId, detail: problem.message }
        : { kind: 'failed', problem };
    }
  }

  #step(edits: PanelEdits, words: string): void {
    this.#show(step(this.#history(), edits, words));
  }

  #show(history: EditHistory): void {
    this.#history.set(history);
    this.#restored.set('');
    const panel = this.#panel();
    if (panel !== null) this.#isKept.set(this.#kept.keep(panel.version.id, history.now));
  }

  /** What was kept, as far as the version has the rows and columns for it. */
  #stillFitting(kept: PanelEdits): PanelEdits {
    const columns = this.#panel()?.columns.length ?? 0;
    let edits = removeRows(noEdits, this.#saved(), [...kept.removed.values()]);
    for (const row of kept.added.values()) edits = addRow(edits, this.#saved(), row);
    const cells = [...kept.cells.values()].filter(({ place }) => place.column < columns);
    return setCells(edits, this.#saved(), cells);
  }
}

/** Cells whose new value is another one than before. */
function countDiffering(before: PanelEdits, now: PanelEdits): number {
  let count = 0;
  for (const [key, { value }] of now.cells) {
    const known = before.cells.get(key);
    if (known === undefined || !Object.is(known.value, value)) count += 1;
  }
  for (const key of before.cells.keys()) if (!now.cells.has(key)) count += 1;
  return count;
}
