import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import type { PanelColumn } from '@contract';
import type { CoverageWindow } from '@panel-data';
import { counted, yearsText } from '../../ui/phrases';
import type { PanelRow } from '../panel-rows';
import { leftOut } from './left-out';
import { modelColumns } from './panel-cells';

const mostListed = 60;

/** The largest fully covered window in words, and what keeps the other companies out of it. */
@Component({
  selector: 'kv-window-line',
  template: `
    <p>
      {{ words() }}
      @if (isAlone() || others().length > 0 || hasFurtherYears()) {
        <button type="button" class="kv-link" (click)="turn()">
          {{ isAlone() ? 'Show all companies and years' : 'Show only these' }}
        </button>
      }
    </p>
    <p class="kv-visually-hidden" role="status">{{ said() }}</p>
    @if (others().length > 0) {
      <details>
        <summary>{{ others().length === 1 ? '1 is' : others().length + ' are' }} not in it</summary>
        <ul>
          @for (each of others().slice(0, mostListed); track each.company) {
            <li>{{ each.company }}: {{ each.why }}</li>
          }
        </ul>
        @if (others().length > mostListed) {
          <p class="kv-caption">and {{ others().length - mostListed }} more</p>
        }
      </details>
    }
  `,
  styles: `
    :host {
      display: block;
      font-size: 13px;
    }
    summary {
      min-block-size: 24px;
      cursor: pointer;
    }
    ul {
      max-block-size: 200px;
      padding-inline-start: 16px;
      overflow-y: auto;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WindowLine {
  readonly window = input.required<CoverageWindow>();
  readonly rows = input.required<readonly PanelRow[]>();
  readonly columns = input.required<readonly PanelColumn[]>();
  /** Whether nothing but the window is shown. */
  readonly isAlone = input(false);

  readonly onlyWanted = output();
  readonly allWanted = output();

  protected readonly mostListed = mostListed;
  protected readonly words = computed(() => {
    const { companies, firstYear, lastYear, rows } = this.window();
    const who = counted(companies.length, 'company', 'companies');
    return `Fully covered: ${who}, ${yearsText(firstYear, lastYear)}, ${counted(rows, 'row')}.`;
  });
  protected readonly hasFurtherYears = computed(() => {
    const { firstYear, lastYear } = this.window();
    return this.rows().some(({ year }) => year < firstYear || year > lastYear);
  });
  /** Nothing before the first turn: what stands from the start is no news. */
  protected readonly said = linkedSignal<boolean, string>({
    source: this.isAlone,
    computation: (isAlone, before) =>
      isAlone
        ? 'Map and rows show these companies and years only.'
        : before === undefined
          ? ''
          : 'Map and rows show all companies and years.',
  });
  protected readonly others = computed(() =>
    leftOut(this.window(), this.rows(), modelColumns(this.columns())),
  );

  /** One button for both ways, so that the focus stays on it. */
  protected turn(): void {
    if (this.isAlone()) this.allWanted.emit();
    else this.onlyWanted.emit();
  }
}
