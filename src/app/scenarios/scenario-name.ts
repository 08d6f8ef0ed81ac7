import {
  ChangeDetectionStrategy,
  Component,
  effect,
  input,
  output,
  untracked,
} from '@angular/core';
import { type AbstractControl, FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatFormField, MatHint, MatLabel, MatError } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { SaveScenario } from '@contract';

/** A scenario's name and note, held to the contract's own rules. */
@Component({
  selector: 'kv-scenario-name',
  imports: [MatError, MatFormField, MatHint, MatInput, MatLabel, ReactiveFormsModule],
  template: `
    <mat-form-field appearance="outline">
      <mat-label>Name of the scenario</mat-label>
      <input
        #nameBox
        matInput
        autocomplete="off"
        maxlength="120"
        [formControl]="nameControl"
        (input)="nameChanged.emit(nameBox.value)"
      />
      <mat-error>{{ complaint() }}</mat-error>
    </mat-form-field>
    <mat-form-field appearance="outline">
      <mat-label>Note</mat-label>
      <textarea
        #noteBox
        matInput
        rows="2"
        maxlength="2000"
        [value]="note()"
        (input)="noteChanged.emit(noteBox.value)"
      ></textarea>
      <mat-hint>What the plan assumes, for whoever reads it later</mat-hint>
    </mat-form-field>
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScenarioName {
  readonly name = input.required<string>();
  readonly note = input.required<string>();
  /** Whether saving was tried, so that a missing name is said. */
  readonly isTried = input(false);
  readonly nameChanged = output<string>();
  readonly noteChanged = output<string>();

  protected readonly nameControl = new FormControl('', {
    nonNullable: true,
    validators: ({ value }: AbstractControl<string>) =>
      nameProblem(value) === '' ? null : { contract: true },
  });

  constructor() {
    // The store owns the text: a draft that came back or another version replaces what stands here.
    effect(() => {
      const name = this.name();
      untracked(() => {
        if (this.nameControl.value !== name) this.nameControl.setValue(name);
      });
    });
    effect(() => {
      if (this.isTried()) this.nameControl.markAsTouched();
      else this.nameControl.markAsUntouched();
    });
  }

  protected complaint(): string {
    return nameProblem(this.nameControl.value);
  }
}

/** What is wrong with a name; empty when nothing is. */
export function nameProblem(name: string): string {
  const parsed = SaveScenario.shape.name.safeParse(name);
  return parsed.success ? '' : (parsed.error.issues[0]?.message ?? 'expected a name');
}
