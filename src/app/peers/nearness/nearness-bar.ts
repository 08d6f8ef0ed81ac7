import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { Mark } from '../../ui/mark';
import { NearnessStore } from './nearness-store';

const scatters = [
  { key: 'classical', words: 'Usual' },
  { key: 'robust', words: 'Robust to outliers' },
] as const;

/** Which measures count towards the distance, and how: the analyst sees and sets it. */
@Component({
  selector: 'kv-nearness-bar',
  imports: [Mark],
  template: `
    <div class="choices">
      <fieldset>
        <legend>Nearness counts</legend>
        @for (measure of store.measures(); track measure.key) {
          <label>
            <input
              type="checkbox"
              [checked]="store.chosen().includes(measure)"
              (change)="store.toggle(measure.key)"
            />
            <span>{{ measure.label }}</span>
          </label>
        }
      </fieldset>
      <fieldset>
        <legend>Spread of the companies</legend>
        @for (scatter of scatters; track scatter.key) {
          <label>
            <input
              type="radio"
              name="kv-scatter"
              [checked]="store.scatter() === scatter.key"
              (change)="store.chooseScatter(scatter.key)"
            />
            <span>{{ scatter.words }}</span>
          </label>
        }
      </fieldset>
    </div>
    <div role="status">
      @for (remark of store.nearness().remarks; track remark) {
        <p class="remark">
          <kv-mark kind="caution" /><span>{{ remark }}</span>
        </p>
      }
    </div>
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
      min-inline-size: 0;
    }
    .choices {
      display: flex;
      flex-wrap: wrap;
      gap: 8px 40px;
    }
    fieldset {
      display: flex;
      flex-wrap: wrap;
      gap: 4px 16px;
      margin: 0;
      padding: 0;
      border: 0;
      min-inline-size: 0;
    }
    legend {
      padding: 0;
      color: var(--kv-soft-ink);
      font-size: 12px;
      line-height: 16px;
    }
    label {
      display: flex;
      align-items: center;
      gap: 6px;
      min-block-size: 24px;
      font-size: 13px;
      overflow-wrap: anywhere;
    }
    input {
      margin: 0;
      accent-color: var(--kv-spruce);
    }
    .remark {
      display: flex;
      gap: 10px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NearnessBar {
  protected readonly store = inject(NearnessStore);

  protected readonly scatters = scatters;
}
