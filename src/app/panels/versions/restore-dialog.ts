import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
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
import { firstValueFrom } from 'rxjs';
import { type ApiProblem, toApiProblem } from '../../api/api-problem';
import { PanelsApi } from '../../api/panels-api';
import { ProblemNotice } from '../../ui/problem-notice';

export interface RestoreQuestion {
  readonly panelVersionId: string;
  /** Of the version that is put back. */
  readonly number: number;
  /** Of the version that it becomes. */
  readonly nextNumber: number;
}

/** Asks for the note to an older version that is put back; closes with the id of the version that was made. */
@Component({
  selector: 'kv-restore-dialog',
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
  template: `
    <form novalidate (submit)="$event.preventDefault(); restore()">
      <h2 mat-dialog-title>Put version {{ question.number }} back?</h2>
      <mat-dialog-content>
        <p>
          Version {{ question.nextNumber }} will hold what version {{ question.number }} holds.
          Every version stays as it is.
        </p>
        <mat-form-field appearance="outline" subscriptSizing="dynamic">
          <mat-label>Note to the version</mat-label>
          <textarea
            #box
            matInput
            rows="2"
            maxlength="2000"
            name="note"
            required
            cdkFocusInitial
            [attr.aria-invalid]="isAsked() && note().trim() === ''"
            [value]="note()"
            (input)="note.set(box.value)"
          ></textarea>
        </mat-form-field>
        @if (problem(); as problem) {
          <kv-problem-notice [problem]="problem.shown" />
        }
      </mat-dialog-content>
      <mat-dialog-actions align="end">
        <p role="status">{{ isAsked() && note().trim() === '' ? 'A note is needed.' : '' }}</p>
        <button matButton type="button" mat-dialog-close>Keep it as it is</button>
        <button matButton="filled" type="submit" [disabled]="isRunning()">
          Put back as version {{ question.nextNumber }}
        </button>
      </mat-dialog-actions>
    </form>
  `,
  styles: `
    mat-form-field {
      inline-size: 100%;
      margin-block-start: 16px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RestoreDialog {
  readonly #panels = inject(PanelsApi);
  readonly #dialog = inject<MatDialogRef<RestoreDialog, string>>(MatDialogRef);
  protected readonly question = inject<RestoreQuestion>(MAT_DIALOG_DATA);

  protected readonly note = signal(`Version ${this.question.number} put back`);
  protected readonly isAsked = signal(false);
  protected readonly isRunning = signal(false);
  protected readonly problem = signal<ApiProblem | null>(null);

  protected async restore(): Promise<void> {
    this.isAsked.set(true);
    const note = this.note().trim();
    if (this.isRunning() || note === '') return;
    this.isRunning.set(true);
    this.problem.set(null);
    try {
      const { id } = await firstValueFrom(this.#panels.restore(this.question.panelVersionId, note));
      this.#dialog.close(id);
    } catch (error) {
      this.problem.set(toApiProblem(error));
    } finally {
      this.isRunning.set(false);
    }
  }
}
