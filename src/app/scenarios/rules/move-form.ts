import { ChangeDetectionStrategy, Component, inject, input, output, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { PlanMove } from '@contract';
import { readNumber } from '../../ui/number-entry';
import { NumberFormat } from '../../ui/number-format';

/** An equity raise or a buyback in a planned year. */
@Component({
  selector: 'kv-move-form',
  imports: [MatButton],
  template: `
    <div class="fields" role="group" aria-label="Equity raise or buyback">
      <label>
        What
        <select #what>
          <option value="raise">Equity raise</option>
          <option value="buyback">Buyback</option>
        </select>
      </label>
      <label>
        Amount, {{ numbers.unitLabel() }}
        <input #amount type="text" inputmode="decimal" autocomplete="off" />
      </label>
      <label>
        In
        <select #year>
          @for (each of years(); track each) {
            <option [value]="each">FY{{ each }}</option>
          }
        </select>
      </label>
      <button
        matButton="outlined"
        type="button"
        (click)="add(what.value, amount.value, +year.value)"
      >
        Add
      </button>
      <button matButton type="button" (click)="closed.emit()">Cancel</button>
    </div>
    @if (complaint() || refusal(); as words) {
      <p role="alert">{{ words }}</p>
    }
  `,
  styleUrl: '../fields.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MoveForm {
  protected readonly numbers = inject(NumberFormat);

  readonly years = input.required<readonly number[]>();
  /** Why the one that was added last could not be followed. */
  readonly refusal = input('');
  readonly moveAdded = output<PlanMove>();
  readonly closed = output();

  protected readonly complaint = signal('');

  protected add(what: string, text: string, year: number): void {
    const shown = readNumber(text);
    if (shown === undefined || !(shown > 0)) {
      this.complaint.set(`Expected an amount above zero; found ${text.trim() || 'nothing'}.`);
      return;
    }
    this.complaint.set('');
    const amount = this.numbers.toPanelUnit(shown);
    this.moveAdded.emit({ year, amount: what === 'buyback' ? -amount : amount });
  }
}
