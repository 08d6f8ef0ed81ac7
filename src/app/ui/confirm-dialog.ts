import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { ConfirmQuestion } from './confirm-question';

/** Opened by `Confirm`; closes with true when the person agrees. */
@Component({
  selector: 'kv-confirm-dialog',
  imports: [
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatFormField,
    MatInput,
    MatLabel,
  ],
  template: `
    <h2 mat-dialog-title>{{ question.title }}</h2>
    <mat-dialog-content>
      <p>{{ question.detail }}</p>
      @if (question.typed; as wanted) {
        <mat-form-field appearance="outline">
          <mat-label>Type {{ wanted }} to go on</mat-label>
          <input #box matInput autocomplete="off" (input)="typed.set(box.value)" />
        </mat-form-field>
      }
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <button matButton [mat-dialog-close]="false" cdkFocusInitial>Keep it as it is</button>
      <button matButton="filled" [mat-dialog-close]="true" [disabled]="!mayGoOn()">
        {{ question.action }}
      </button>
    </mat-dialog-actions>
  `,
  styles: `
    mat-form-field {
      inline-size: 100%;
      margin-block-start: 16px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConfirmDialog {
  protected readonly question = inject<ConfirmQuestion>(MAT_DIALOG_DATA);
  protected readonly typed = signal('');
  protected readonly mayGoOn = computed(
    () => this.question.typed === undefined || this.typed().trim() === this.question.typed,
  );
}
