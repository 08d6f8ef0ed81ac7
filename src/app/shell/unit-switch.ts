import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { MoneyUnit } from '@figures';

const units: readonly MoneyUnit[] = ['units', 'thousands', 'millions', 'billions'];

/** In which unit money is shown: tables, charts and exports follow together. A list to choose from where room is short. */
@Component({
  selector: 'kv-unit-switch',
  template: `
    <fieldset>
      <legend class="kv-visually-hidden">Money is shown in</legend>
      @for (each of units; track each) {
        <label [class.chosen]="each === unit()">
          <input
            type="radio"
            name="kv-unit"
            class="kv-visually-hidden"
            [value]="each"
            [checked]="each === unit()"
            (change)="unitChanged.emit(each)"
          />{{ each }}
        </label>
      }
    </fieldset>
    <select #list aria-label="Money is shown in" [value]="unit()" (change)="choose(list.value)">
      @for (each of units; track each) {
        <option [value]="each" [selected]="each === unit()">{{ each }}</option>
      }
    </select>
  `,
  styles: `
    fieldset {
      display: flex;
      margin: 0;
      padding: 0;
      border: 1px solid var(--kv-hairline);
      border-radius: var(--kv-corner);
      font-size: 12px;
    }
    label {
      position: relative;
      padding: 5px 12px;
      color: var(--kv-soft-ink);
      cursor: pointer;
    }
    label + label {
      border-inline-start: var(--kv-rule);
    }
    label.chosen {
      background: var(--kv-sunken);
      color: var(--kv-ink);
      font-weight: 500;
      box-shadow: inset 0 -2px var(--kv-spruce);
    }
    label:has(:focus-visible) {
      outline: 2px solid var(--kv-spruce);
      outline-offset: 2px;
    }
    select {
      display: none;
      min-block-size: 32px;
      background: var(--kv-paper);
      color: var(--kv-ink);
      border: 1px solid var(--kv-edge);
      border-radius: var(--kv-corner);
      font: inherit;
      font-size: 12px;
    }
    @media (forced-colors: active) {
      label.chosen {
        text-decoration: underline 2px;
      }
    }
    @media (width < 960px) {
      fieldset {
        display: none;
      }
      select {
        display: block;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UnitSwitch {
  readonly unit = input.required<MoneyUnit>();
  readonly unitChanged = output<MoneyUnit>();

  protected readonly units = units;

  protected choose(value: string): void {
    const unit = units.find((each) => each === value);
    if (unit !== undefined) this.unitChanged.emit(unit);
  }
}
