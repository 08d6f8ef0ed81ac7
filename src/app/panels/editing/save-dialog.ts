import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { ApiProblem } from '../../api/api-problem';
import { counted, listed } from '../../ui/phrases';
import { ProblemNotice } from '../../ui/problem-notice';
import type { SaveOutcome } from './edits-store';
import type { EditGround } from './panel-edits';
import { type SaveDraft, type SaveLine, groundOf, isComplete, missingGround } from './save-lines';

/** The version that was saved, or the wish to carry the edits onto the one that somebody else saved. */
export type SaveResult =
  { readonly kind: 'saved'; readonly panelVersionId: string } | { readonly kind: 'carry' };

export interface SaveQuestion {
  /** Of the version to come. */
  readonly number: number;
  /** `12 cells and 1 row`. */
  readonly changes: string;
  readonly lines: readonly SaveLine[];
  /** Rows added and removed, in words. */
  readonly rowLines: readonly string[];
  /** `EUR m`. */
  readonly unit: string;
  readonly words: (value: number | null, column: number) => string;
  readonly draft: SaveDraft;
  /** What is written stays, whatever becomes of the dialog. */
  readonly keep: (draft: SaveDraft) => void;
  readonly save: (draft: SaveDraft) => Promise<SaveOutcome>;
  /** Where the server's answer names a cell: its place among what was sent, by the line's key. */
  readonly sentAt: (key: string) => number;
}

const linesAtOnce = 200;

/** Asks for the note, and each change's reason and source. */
@Component({
  selector: 'kv-save-dialog',
  imports: [
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatFormField,
    MatInput,
    MatLabel,
    ProblemNotice,
  ],
  templateUrl: './save-dialog.html',
  styleUrl: './save-dialog.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SaveDialog {
  readonly #dialog = inject<MatDialogRef<SaveDialog, SaveResult>>(MatDialogRef);
  protected readonly question = inject<SaveQuestion>(MAT_DIALOG_DATA);

  protected readonly draft = signal(this.question.draft);
  protected readonly shownLines = signal(linesAtOnce);
  protected readonly isAsked = signal(false);
  protected readonly isRunning = signal(false);
  protected readonly problem = signal<ApiProblem | null>(null);
  /** Who was faster, in words; empty where nobody was. */
  protected readonly stale = signal('');
  readonly #missing = computed(() => missingGround(this.draft(), this.question.lines));
  protected readonly needed = computed(() => {
    const { note, reasons, sources } = this.#missing();
    const words = [
      ...(note ? ['a note'] : []),
      ...(reasons > 0 ? [`a reason for ${counted(reasons, 'cell')}`] : []),
      ...(sources > 0 ? [`a source for ${counted(sources, 'cell')}`] : []),
    ];
    return words.length === 0 ? '' : `Still needed: ${listed(words)}.`;
  });

  protected name({ place, title }: SaveLine): string {
    return `${title}, ${place.company} ${place.year}`;
  }

  protected ground(line: SaveLine): EditGround {
    return groundOf(this.draft(), line.key);
  }

  /** What the server says of a cell's reason or source. */
  protected complaint(line: SaveLine, part: keyof EditGround): string | undefined {
    const problem = this.problem();
    if (problem === null) return undefined;
    return problem.fieldError(`/cells/${this.question.sentAt(line.key)}/${part}`);
  }

  protected change(part: Partial<SaveDraft>): void {
    this.draft.update((draft) => ({ ...draft, ...part }));
    this.question.keep(this.draft());
  }

  protected changeCommon(part: Partial<EditGround>): void {
    this.change({ common: { ...this.draft().common, ...part } });
  }

  protected changeOwn({ key }: SaveLine, part: Partial<EditGround>): void {
    const own = new Map(this.draft().own);
    own.set(key, { ...own.get(key), ...part });
    this.change({ own });
  }

  protected showMore(): void {
    this.shownLines.update((count) => count + linesAtOnce);
  }

  protected async save(): Promise<void> {
    this.isAsked.set(true);
    if (this.isRunning() || !isComplete(this.#missing())) return;
    this.isRunning.set(true);
    const outcome = await this.question.save(this.draft());
    this.isRunning.set(false);
    this.problem.set(outcome.kind === 'failed' ? outcome.problem : null);
    this.stale.set(outcome.kind === 'stale' ? outcome.detail : '');
    if (outcome.kind === 'saved') this.#dialog.close(outcome);
  }

  protected carry(): void {
    this.#dialog.close({ kind: 'carry' });
  }
}
