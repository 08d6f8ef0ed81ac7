import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { readNumber } from '../../ui/number-entry';

/** A bound that a person types; what is no number is put back. */
@Component({
  selector: 'kv-figure-filter',
  imports: [MatFormFieldModule, MatInput],
  template: `
    <mat-form-field appearance="outline" subscriptSizing="dynamic">
      <mat-label>{{ label() }}</mat-label>
      <input
        #box
        matInput
        inputmode="decimal"
        autocomplete="off"
        [value]="value()"
        (change)="enter(box)"
      />
    </mat-form-field>
  `,
  styles: `
    mat-form-field {
      inline-size: 100%;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FigureFilter {
  readonly label = input.required<string>();
  /** As it is shown; empty where nothing is asked. */
  readonly value = input.required<string>();
  /** Null where it was emptied. */
  readonly entered = output<number | null>();

  protected enter(box: HTMLInputElement): void {
    const typed = readNumber(box.value);
    if (typed === undefined && box.value.trim() !== '') box.value = this.value();
    else this.entered.emit(typed ?? null);
  }
}
