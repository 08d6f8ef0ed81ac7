import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
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
import type { Flag } from '@panel-data';
import type { ApiProblem } from '../../api/api-problem';
import { ProblemNotice } from '../../ui/problem-notice';

export interface DismissQuestion {
  readonly flag: Flag;
  /** Of the same kind, and of the company or its double. */
  readonly alike: readonly Flag[];
  /** A flag with its cell and figures, in one line. */
  readonly line: (flag: Flag) => string;
  /** @returns why it could not be done. */
  readonly dismiss: (flags: readonly Flag[], reason: string) => Promise<ApiProblem | null>;
}

/** Asks why a flagged figure is right, and of which others of its kind the same can be said. */
@Component({
  selector: 'kv-dismiss-dialog',
  imports: [
    MatButton,
    MatCheckbox,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatFormField,
    MatInput,
    MatLabel,
    ProblemNotice,
  ],
  templateUrl: './dismiss-dialog.html',
  styles: `
    mat-form-field {
      inline-size: 100%;
      margin-block: 16px 8px;
    }
    fieldset {
      margin: 0;
      padding: 0;
      border: 0;
    }
    ul {
      max-block-size: 200px;
      padding: 0;
      list-style: none;
      overflow-y: auto;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DismissDialog {
  readonly #dialog = inject<MatDialogRef<DismissDialog, number>>(MatDialogRef);
  protected readonly question = inject<DismissQuestion>(MAT_DIALOG_DATA);

  protected readonly reason = signal('');
  protected readonly chosen = signal<ReadonlySet<Flag>>(new Set());
  protected readonly isAsked = signal(false);
  protected readonly isRunning = signal(false);
  protected readonly problem = signal<ApiProblem | null>(null);

  protected choose(flag: Flag, isChosen: boolean): void {
    this.chosen.update((chosen) => {
      const next = new Set(chosen);
      if (isChosen) next.add(flag);
      else next.delete(flag);
      return next;
    });
  }

  protected chooseAll(isChosen: boolean): void {
    this.chosen.set(new Set(isChosen ? this.question.alike : []));
  }

  protected async dismiss(): Promise<void> {
    this.isAsked.set(true);
    const reason = this.reason().trim();
    if (this.isRunning() || reason === '') return;
    this.isRunning.set(true);
    const flags = [this.question.flag, ...this.chosen()];
    const problem = await this.question.dismiss(flags, reason);
    this.isRunning.set(false);
    this.problem.set(problem);
    if (problem === null) this.#dialog.close(flags.length);
  }
}
