import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { Mark } from '../ui/mark';
import { yearSpan } from './panel-finding';
import { rowsWithGaps, shorterCompanies } from './panel-gaps';
import type { PanelRow } from './panel-rows';
import { counted } from '../ui/phrases';

const shownGaps = 8;
const shownCompanies = 6;

/** What the panel lacks, in words: each missing cell leads to its row. */
@Component({
  selector: 'kv-gap-list',
  imports: [Mark],
  template: `
    <h2>What is missing</h2>
    @if (gaps().length === 0) {
      <p><kv-mark kind="fine" /> Every row has every figure.</p>
    } @else {
      <ul>
        @for (gap of gaps().slice(0, shownGaps); track gap.fileRow) {
          <li>
            <kv-mark kind="caution" />
            <button type="button" class="kv-link" (click)="rowWanted.emit(gap)">
              {{ gap.company }} FY{{ gap.year }}
            </button>
            <span>{{ gap.missing.join(', ') }}</span>
          </li>
        }
      </ul>
      @if (gaps().length > shownGaps) {
        <p class="kv-caption">and {{ more(gaps().length - shownGaps, 'more row') }}</p>
      }
      <p class="kv-caption">A row counts in a fit only with every figure that the fit uses.</p>
    }
    @if (shorter().length > 0) {
      <h3>Not in every year</h3>
      <ul>
        @for (each of shorter().slice(0, shownCompanies); track each.company) {
          <li>
            <span>
              {{ each.company }} {{ years(each.firstYear, each.lastYear) }}
              @if (each.yearsWithoutRow.length > 0) {
                without {{ each.yearsWithoutRow.join(', ') }}
              }
            </span>
          </li>
        }
      </ul>
      @if (shorter().length > shownCompanies) {
        <p class="kv-caption">
          and {{ more(shorter().length - shownCompanies, 'more company', 'more companies') }}
        </p>
      }
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
      align-content: start;
    }
    h3 {
      margin-block-start: 8px;
    }
    ul {
      display: grid;
      gap: 2px;
      padding: 0;
      list-style: none;
      font-size: 13px;
    }
    li {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 0 8px;
      min-block-size: 28px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GapList {
  readonly rows = input.required<readonly PanelRow[]>();
  readonly titles = input.required<readonly string[]>();
  readonly rowWanted = output<{ readonly company: string; readonly year: number }>();

  protected readonly shownGaps = shownGaps;
  protected readonly shownCompanies = shownCompanies;
  protected readonly years = yearSpan;
  protected readonly more = counted;
  protected readonly gaps = computed(() => rowsWithGaps(this.rows(), this.titles()));
  protected readonly shorter = computed(() => shorterCompanies(this.rows()));
}
