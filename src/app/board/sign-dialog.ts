import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
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
import type { ApiProblem } from '../api/api-problem';
import { ProblemNotice } from '../ui/problem-notice';

export interface SignQuestion {
  readonly number: number;
  readonly sha256: string;
  /** The signed edition that this one will supersede; null where there is none. */
  readonly supersedes: number | null;
  /** @returns the problem that kept it from being signed, or null. */
  readonly sign: (password: string) => Promise<ApiProblem | null>;
}

/** Asks for the password again and says what a signature does. */
@Component({
  selector: 'kv-sign-dialog',
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
    <form [formGroup]="form" (ngSubmit)="sign()">
      <h2 mat-dialog-title>Sign edition {{ question.number }}?</h2>
      <mat-dialog-content>
        <p>
          Your name and the time are put under the edition as it stands. Readers of the workspace
          can open it from then on.
          @if (question.supersedes !== null) {
            It supersedes edition {{ question.supersedes }}, which stays readable.
          }
          A signature cannot be taken back.
        </p>
        <p class="kv-caption hash">
          SHA-256 <span class="kv-number">{{ question.sha256 }}</span>
        </p>
        <mat-form-field appearance="outline">
          <mat-label>Your password</mat-label>
          <input
            matInput
            type="password"
            autocomplete="current-password"
            formControlName="password"
            cdkFocusInitial
          />
          @if (form.controls.password.hasError('wrong')) {
            <mat-error>This is not the password of your account.</mat-error>
          } @else {
            <mat-error>expected the password that you sign in with</mat-error>
          }
        </mat-form-field>
        @if (problem(); as found) {
          <kv-problem-notice [problem]="found.shown" />
        }
      </mat-dialog-content>
      <mat-dialog-actions align="end">
        <button matButton type="button" mat-dialog-close>Do not sign</button>
        <button matButton="filled" type="submit" [disabled]="isRunning()">
          Sign edition {{ question.number }}
        </button>
      </mat-dialog-actions>
    </form>
  `,
  styleUrl: './decision-dialog.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignDialog {
  readonly #dialog = inject<MatDialogRef<SignDialog>>(MatDialogRef);
  protected readonly question = inject<SignQuestion>(MAT_DIALOG_DATA);

  protected readonly form = new FormGroup({
    password: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.maxLength(128)],
    }),
  });
  protected readonly isRunning = signal(false);
  protected readonly problem = signal<ApiProblem | null>(null);

  protected async sign(): Promise<void> {
    const { password } = this.form.controls;
    if (this.form.invalid || this.isRunning()) return;
    this.isRunning.set(true);
    this.problem.set(null);
    const problem = await this.question.sign(password.value);
    this.isRunning.set(false);
    if (problem === null) this.#dialog.close();
    else if (problem.slug === 'wrong-credentials') password.setErrors({ wrong: true });
    else this.problem.set(problem);
  }
}
