import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
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
import { counted } from '../../ui/phrases';
import { longestReason } from './reason-field';

/** One reason asked for several companies. */
export interface ReasonQuestion {
  readonly title: string;
  readonly companies: readonly string[];
  /** The verb on the button: `Take in`. */
  readonly action: string;
  /** Reasons that are written already. */
  readonly reasons: readonly string[];
  /** How many of the companies have a reason of that side already. */
  readonly written: number;
}

export interface ReasonAnswer {
  readonly reason: string;
  /** Whether it also stands where another reason is written. */
  readonly replaces: boolean;
}

const mostNamed = 8;

/** Asks for the one reason that several companies are to have. */
@Component({
  selector: 'kv-reason-dialog',
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
    ReactiveFormsModule,
  ],
  template: `
    <form [formGroup]="form" (ngSubmit)="answer()">
      <h2 mat-dialog-title>{{ question.title }}</h2>
      <mat-dialog-content>
        <p>{{ names }}</p>
        @if (question.reasons.length > 0) {
          <mat-form-field appearance="outline" subscriptSizing="dynamic">
            <mat-label>A reason already written</mat-label>
            <select #list matNativeControl (change)="take(list.value)">
              <option value=""></option>
              @for (reason of question.reasons; track reason) {
                <option [value]="reason">{{ reason }}</option>
              }
            </select>
          </mat-form-field>
        }
        <mat-form-field appearance="outline" subscriptSizing="dynamic">
          <mat-label>Reason</mat-label>
          <textarea
            matInput
            rows="3"
            formControlName="reason"
            cdkFocusInitial
            [attr.maxlength]="longest"
          ></textarea>
        </mat-form-field>
        @if (question.written > 0) {
          <mat-checkbox formControlName="replaces">
            Also in place of {{ counted(question.written, 'reason') }} written before
          </mat-checkbox>
        }
      </mat-dialog-content>
      <mat-dialog-actions align="end">
        <button matButton type="button" [mat-dialog-close]="null">Keep it as it is</button>
        <button matButton="filled" type="submit" [disabled]="!isWritten()">
          {{ question.action }}
        </button>
      </mat-dialog-actions>
    </form>
  `,
  styles: `
    mat-dialog-content {
      display: grid;
      gap: 12px;
    }
    mat-form-field {
      inline-size: 100%;
      margin-block-start: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReasonDialog {
  readonly #dialog = inject<MatDialogRef<ReasonDialog, ReasonAnswer>>(MatDialogRef);
  protected readonly question = inject<ReasonQuestion>(MAT_DIALOG_DATA);

  protected readonly counted = counted;
  protected readonly longest = longestReason;
  protected readonly form = new FormGroup({
    reason: new FormControl('', { nonNullable: true }),
    replaces: new FormControl(false, { nonNullable: true }),
  });
  protected readonly names = namesOf(this.question.companies);

  protected isWritten(): boolean {
    return this.form.controls.reason.value.trim() !== '';
  }

  protected take(reason: string): void {
    if (reason !== '') this.form.controls.reason.setValue(reason);
  }

  protected answer(): void {
    if (!this.isWritten()) return;
    const { reason, replaces } = this.form.getRawValue();
    this.#dialog.close({ reason: reason.trim(), replaces });
  }
}

function namesOf(companies: readonly string[]): string {
  const more = companies.length - mostNamed;
  const named = companies.slice(0, mostNamed).join(', ');
  return more > 0 ? `${named} and ${more} more.` : `${named}.`;
}
