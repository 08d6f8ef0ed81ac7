import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButtonModule } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInputModule } from '@angular/material/input';
import { CommitImport } from '@contract';
import { byContract, errorWords } from '../../ui/contract-validator';

/** Makes the checked file a panel version, with a note for whoever asks later. */
@Component({
  selector: 'kv-commit-form',
  imports: [MatButtonModule, MatFormFieldModule, MatInputModule, ReactiveFormsModule],
  template: `
    <form [formGroup]="form" (ngSubmit)="commit()" novalidate>
      <mat-form-field appearance="outline" floatLabel="always" subscriptSizing="dynamic">
        <mat-label>Note</mat-label>
        <textarea matInput formControlName="note" rows="2"></textarea>
        <mat-hint
          >Where the figures come from and what was done to them; stays with the version</mat-hint
        >
        <mat-error>{{ words(form.controls.note) }}</mat-error>
      </mat-form-field>
      <button mat-flat-button type="submit" [disabled]="isBusy()">{{ action() }}</button>
    </form>
  `,
  styles: `
    form {
      display: grid;
      justify-items: start;
      gap: 16px;
      max-inline-size: 640px;
    }
    mat-form-field {
      inline-size: 100%;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CommitForm {
  /** `Bring in as version 2`. */
  readonly action = input.required<string>();
  readonly isBusy = input(false);
  readonly committed = output<string>();

  protected readonly words = errorWords;
  protected readonly form = inject(NonNullableFormBuilder).group({
    note: ['', [byContract(CommitImport.shape.note)]],
  });

  protected commit(): void {
    this.form.markAllAsTouched();
    if (this.form.valid) this.committed.emit(this.form.getRawValue().note);
  }
}
