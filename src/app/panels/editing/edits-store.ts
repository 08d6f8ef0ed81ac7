import { Injectable, computed, inject, linkedSignal, signal } from '@angular/core';
import type { PanelVersionReply, SaveCorrections } from '@contract';
import { firstValueFrom } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../../api/api-problem';
import { PanelsApi } from '../../api/panels-api';
import { counted } from '../../ui/phrases';
import { panelRows } from '../panel-rows';
import { type Carrying, type EditedVersion, carriedDraft, carriedEdits } from './carry-over';
import { type EditHistory, noHistory, redo, step, undo } from './edit-history';
import { editsWords } from './edit-words';
import { KeptEdits } from './kept-edits';
import {
  type CellChange,
  type PanelEdits,
  type RowPlace,
  type SavedRows,
  addRow,
  countEdits,
  editedRows,
  noEdits,
  removeRows,
  savedRows,
  setCells,
} from './panel-edits';
import { type SaveDraft, emptyDraft } from './save-lines';

export type SaveOutcome =
  | { readonly kind: 'saved'; readonly panelVersionId: string }
  /** Somebody saved a newer version meanwhile. */
  | { readonly kind: 'stale'; readonly detail: string }
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
  readonly #draft = signal(emptyDraft);
  readonly #isSaved = signal(false);
  readonly #newerId = signal<string | null>(null);

  /** What the version holds; once the edits are saved, what the next one does. */
  readonly #savedRows = linkedSignal(() => {
    const panel = this.#panel();
    return panel === null ? [] : panelRows(panel);
  });
  readonly savedRows = this.#savedRows.asReadonly();
  readonly #saved = computed(() => savedRows(this.savedRows()));
  /** What the version holds, by row key. */
  readonly saved = this.#saved;
  readonly edits = computed(() => this.#history().now);
  readonly count = computed(() => countEdits(this.edits()));
  /** The version's rows as they would be saved. */
  readonly rows = computed(() => {
    // Without edits nobody needs a key for each of the rows.
    if (this.count() === 0) return this.savedRows();
    const columns = this.#panel()?.columns.length ?? 0;
    return editedRows(this.savedRows(), this.#saved(), columns, this.edits());
  });
  /** What Undo would take back, and Redo would do again; empty where there is nothing. */
  readonly undoWords = computed(() => this.#history().past.at(-1)?.words ?? '');
  readonly redoWords = computed(() => this.#history().future.at(-1)?.words ?? '');
  /** Whether the edits would outlive a reload. */
  readonly isKept = this.#isKept.asReadonly();
  /** What came back from before the page was loaded again, as `12 cells and 1 row`; empty where nothing did. */
  readonly restored = this.#restored.asReadonly();
  /** What is said of the edits so far. */
  readonly draft = this.#draft.asReadonly();
  /** Whether the edits are a version by now, which is on its way to the page: nothing is changed until it is there. */
  readonly isSaved = this.#isSaved.asReadonly();
  /** Of the version that somebody saved meanwhile, known from a save that was refused. */
  readonly newerId = this.#newerId.asReadonly();

  /** Begins with a version, and with what was not saved of it before. */
  open(panel: PanelVersionReply): void {
    this.#panel.set(panel);
    this.#isSaved.set(false);
    this.#newerId.set(null);
    const kept = this.#kept.recall(panel.version.id);
    const edits = kept === null ? noEdits : fitting(kept, this.#saved(), panel.columns.length);
    this.#history.set({ ...noHistory, now: edits });
    this.#draft.set(this.#kept.recallDraft(panel.version.id) ?? emptyDraft);
    this.#restored.set(editsWords(edits));
  }

  /** What is written stays, whatever becomes of the dialog, and comes back with the edits. */
  write(draft: SaveDraft): void {
    this.#draft.set(draft);
    const panel = this.#panel();
    if (panel !== null) this.#keepDraft(panel.version.id);
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
      this.#isSaved.set(true);
      this.#savedRows.set(this.rows());
      this.#draft.set(emptyDraft);
      this.#show(noHistory);
      return { kind: 'saved', panelVersionId: saved.id };
    } catch (error) {
      const problem = toApiProblem(error);
      const { latestId } = problem.problem;
      if (problem.slug !== 'stale-version' || typeof latestId !== 'string')
        return { kind: 'failed', problem };
      this.#newerId.set(latestId);
      return { kind: 'stale', detail: problem.message };
    }
  }

  /** The version with the edits that are not saved, those of the panel that is open. */
  edited(): EditedVersion {
    return {
      columns: this.#panel()?.columns ?? [],
      saved: this.#saved(),
      edits: this.edits(),
    };
  }

  /** Another version of the panel, with what was not saved of it. */
  editedAt(panel: PanelVersionReply): EditedVersion {
    const { columns } = panel;
    const saved = savedRows(panelRows(panel));
    const kept = this.#kept.recall(panel.version.id);
    const edits = kept === null ? noEdits : fitting(kept, saved, columns.length);
    return { columns, saved, edits };
  }

  /**
   * Puts the edits down for the newer version, where they are once it is opened; what has no column there stays here.
   *
   * @param mine  keys of the conflicts that go the person's way.
   */
  carry(newerId: string, onto: EditedVersion, carrying: Carrying, mine: ReadonlySet<string>): void {
    const there = this.#kept.recallDraft(newerId) ?? emptyDraft;
    const from = this.edited().columns;
    const draft = carriedDraft(this.#draft(), carrying, from, onto.columns, there);
    this.#kept.keep(newerId, carriedEdits(carrying, mine, onto));
    this.#kept.keepDraft(newerId, draft);
    this.#show({ ...noHistory, now: carrying.left });
  }

  #step(edits: PanelEdits, words: string): void {
    this.#show(step(this.#history(), edits, words));
  }

  #show(history: EditHistory): void {
    this.#history.set(history);
    this.#restored.set('');
    const panel = this.#panel();
    if (panel === null) return;
    const areKept = this.#kept.keep(panel.version.id, history.now);
    this.#isKept.set(this.#keepDraft(panel.version.id) && areKept);
  }

  /** With nothing changed there is nothing to say of it; the words stay on the page, for Undo. */
  #keepDraft(panelVersionId: string): boolean {
    return this.#kept.keepDraft(panelVersionId, this.count() === 0 ? emptyDraft : this.#draft());
  }
}

/** What was kept, as far as the version has the rows and columns for it. */
function fitting(kept: PanelEdits, saved: SavedRows, columns: number): PanelEdits {
  let edits = removeRows(noEdits, saved, [...kept.removed.values()]);
  for (const row of kept.added.values()) edits = addRow(edits, saved, row);
  const cells = [...kept.cells.values()].filter(({ place }) => place.column < columns);
  return setCells(edits, saved, cells);
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
