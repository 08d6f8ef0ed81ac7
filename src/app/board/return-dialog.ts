import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { ReturnEdition } from '@contract';
import type { ApiProblem } from '../api/api-problem';
import { ProblemNotice } from '../ui/problem-notice';

export interface ReturnQuestion {
  readonly number: number;
  readonly publishedBy: string;
  /** @returns the problem that kept it from being returned, or null. */
  readonly sendBack: (comment: string) => Promise<ApiProblem | null>;
}

/** Asks what has to change before an edition goes back to who published it. */
@Component({
  selector: 'kv-return-dialog',
  imports: [
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    ProblemNotice,
    ReactiveFormsModule,
  ],
  template: `
    <form [formGroup]="form" (ngSubmit)="sendBack()">
      <h2 mat-dialog-title>Return edition {{ question.number }}?</h2>
      <mat-dialog-content>
        <p>
          {{ question.publishedBy }} reads your comment beside it. The edition stays as it is and
          can no longer be signed; what is mended comes as a new edition.
        </p>
        <mat-form-field appearance="outline">
          <mat-label>What has to change</mat-label>
          <textarea
            matInput
            rows="4"
            maxlength="4000"
            formControlName="comment"
            cdkFocusInitial
          ></textarea>
          <mat-error>{{ complaint() }}</mat-error>
        </mat-form-field>
        @if (problem(); as found) {
          <kv-problem-notice [problem]="found.shown" />
        }
      </mat-dialog-content>
      <mat-dialog-actions align="end">
        <button matButton type="button" mat-dialog-close>Keep it</button>
        <button matButton="filled" type="submit" [disabled]="isRunning()">
          Return edition {{ question.number }}
        </button>
      </mat-dialog-actions>
    </form>
  `,
  styleUrl: './decision-dialog.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReturnDialog {
  readonly #dialog = inject<MatDialogRef<ReturnDialog>>(MatDialogRef);
  protected readonly question = inject<ReturnQuestion>(MAT_DIALOG_DATA);

  protected readonly form = new FormGroup({
    comment: new FormControl('', {
      nonNullable: true,
      validators: ({ value }) => {
        const parsed = ReturnEdition.safeParse({ comment: value as unknown });
        return parsed.success ? null : { contract: parsed.error.issues[0]?.message };
      },
    }),
  });
  protected readonly isRunning = signal(false);
  protected readonly problem = signal<ApiProblem | null>(null);

  protected complaint(): string {
    const found: unknown = this.form.controls.comment.getError('contract');
    return typeof found === 'string' ? found : '';
  }

  protected async sendBack(): Promise<void> {
    if (this.form.invalid || this.isRunning()) return;
    this.isRunning.set(true);
    const problem = await this.question.sendBack(this.form.controls.comment.value);
    this.isRunning.set(false);
    this.problem.set(problem);
    if (problem === null) this.#dialog.close();
  }
}
