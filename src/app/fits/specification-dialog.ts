import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { type Specification, SpecificationForm } from './specification-form';

export interface SpecificationQuestion {
  readonly specification: Specification;
  readonly columns: readonly string[];
}

/** Asks for another specification on the same peers; closes with it, or without. The fit shown stays as it is. */
@Component({
  selector: 'kv-specification-dialog',
  imports: [MatButton, MatDialogClose, MatDialogContent, MatDialogTitle, SpecificationForm],
  template: `
    <h2 mat-dialog-title>Change specification</h2>
    <mat-dialog-content>
      <p class="kv-caption">This runs another fit on the same peers. The one shown stays.</p>
      <kv-specification-form
        [specification]="question.specification"
        [columns]="question.columns"
        (started)="dialog.close($event)"
      >
        <button matButton type="button" mat-dialog-close>Keep it as it is</button>
      </kv-specification-form>
    </mat-dialog-content>
  `,
  styles: `
    p {
      margin-block-end: 16px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SpecificationDialog {
  protected readonly question = inject<SpecificationQuestion>(MAT_DIALOG_DATA);
  protected readonly dialog =
    inject<MatDialogRef<SpecificationDialog, Specification>>(MatDialogRef);
}
