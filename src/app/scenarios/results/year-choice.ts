import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';

/** Which planned year a result is of. */
@Component({
  selector: 'kv-year-choice',
  template: `
    <label>
      Year
      <select #list class="kv-no-print" (change)="yearChosen.emit(+list.value)">
        @for (of of years(); track of) {
          <option [value]="of" [selected]="of === year()">FY{{ of }}</option>
        }
      </select>
    </label>
  `,
  styleUrls: ['../fields.css', './results.css'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class YearChoice {
  readonly years = input.required<readonly number[]>();
  readonly year = input.required<number>();
  readonly yearChosen = output<number>();
}
