import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { FigureChoice, NamedChoice } from './figure-choice';

/** Switches so far: radio buttons of one hold together by a name of their own. */
let switches = 0;

/** Which figure a picture shows. */
@Component({
  selector: 'kv-figure-switch',
  template: `
    <fieldset class="kv-no-print">
      <legend class="kv-visually-hidden">{{ legend() }}</legend>
      @for (each of choices(); track each.choice) {
        <label [class.chosen]="each.choice === chosen()">
          <input
            type="radio"
            class="kv-visually-hidden"
            [name]="name"
            [checked]="each.choice === chosen()"
            (change)="chosenChange.emit(each.choice)"
          />{{ each.label }}
        </label>
      }
    </fieldset>
  `,
  styles: `
    fieldset {
      display: flex;
      flex-wrap: wrap;
      justify-self: start;
      inline-size: fit-content;
      max-inline-size: 100%;
      margin: 0;
      padding: 0;
      border: 1px solid var(--kv-hairline);
      border-radius: var(--kv-corner);
      font-size: 12px;
      line-height: 16px;
    }
    label {
      position: relative;
      padding: 5px 12px;
      color: var(--kv-soft-ink);
      cursor: pointer;
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
    @media (forced-colors: active) {
      label.chosen {
        text-decoration: underline 2px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FigureSwitch {
  /** What is chosen, in words: `Picture of`. */
  readonly legend = input.required<string>();
  readonly choices = input.required<readonly NamedChoice[]>();
  readonly chosen = input.required<FigureChoice>();
  readonly chosenChange = output<FigureChoice>();

  protected readonly name = `kv-figure-switch-${++switches}`;
}
