import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { TextDifference } from '../text-differences';

/** Two versions of a scenario side by side, place by place; with `isChoice` each place is taken from one of them. */
@Component({
  selector: 'kv-difference-table',
  template: `
    <div class="kv-table-scroll" tabindex="0" role="region" [attr.aria-label]="label()">
      <table class="kv-table">
        <thead>
          <tr>
            <th scope="col">Where</th>
            <th scope="col">{{ leftName() }}</th>
            <th scope="col">{{ rightName() }}</th>
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track row.key) {
            <tr>
              <th scope="row">{{ row.label }}</th>
              @if (isChoice()) {
                <td>
                  <label>
                    <input
                      type="radio"
                      [name]="row.key"
                      [attr.aria-label]="row.label + ': ' + leftName() + ', ' + row.left"
                      [checked]="!fromRight().has(row.key)"
                      (change)="chosen.emit({ key: row.key, side: 'left' })"
                    />
                    {{ row.left }}
                  </label>
                </td>
                <td>
                  <label>
                    <input
                      type="radio"
                      [name]="row.key"
                      [attr.aria-label]="row.label + ': ' + rightName() + ', ' + row.right"
                      [checked]="fromRight().has(row.key)"
                      (change)="chosen.emit({ key: row.key, side: 'right' })"
                    />
                    {{ row.right }}
                  </label>
                </td>
              } @else {
                <td>{{ row.left }}</td>
                <td>{{ row.right }}</td>
              }
            </tr>
          }
        </tbody>
      </table>
    </div>
  `,
  styles: `
    :host {
      display: block;
      min-inline-size: 0;
    }
    td {
      font-family: var(--kv-figures);
      overflow-wrap: anywhere;
      white-space: normal;
    }
    label {
      display: flex;
      align-items: center;
      gap: 8px;
      min-block-size: 24px;
    }
    input {
      flex: none;
      inline-size: 18px;
      block-size: 18px;
      margin: 0;
      accent-color: var(--kv-plum);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DifferenceTable {
  readonly rows = input.required<readonly TextDifference[]>();
  readonly leftName = input.required<string>();
  readonly rightName = input.required<string>();
  readonly label = input.required<string>();
  readonly isChoice = input(false);
  /** Keys of the places that are taken from the right one. */
  readonly fromRight = input<ReadonlySet<string>>(new Set());
  readonly chosen = output<{ readonly key: string; readonly side: 'left' | 'right' }>();
}
