import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { FitResult, Lag } from '@contract';
import { counted, yearsText } from '../ui/phrases';
import { droppedRows } from './dropped-rows';

const mostListed = 50;

/** Which rows of the panel went in, and which dropped out and why. */
@Component({
  selector: 'kv-sample-notes',
  imports: [RouterLink],
  template: `
    <p>{{ used() }}</p>
    @if (dropped().length > 0) {
      <p>{{ droppedWords() }}</p>
      <ul>
        @for (row of listed(); track row.name) {
          <li>
            <a [routerLink]="['/panel', panelVersionId()]" [queryParams]="row.address"
              >{{ row.name }}: {{ row.missing }} missing</a
            >
          </li>
        }
      </ul>
      @if (dropped().length > listed().length) {
        <p class="kv-caption">
          {{ dropped().length - listed().length }} more are flagged on the panel.
        </p>
      }
    } @else {
      <p>No row dropped out.</p>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
    }
    ul {
      columns: 260px;
      padding-inline-start: 16px;
      font-size: 13px;
      line-height: 24px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SampleNotes {
  readonly sample = input.required<FitResult['sample']>();
  /** Column of the market value, which no lag moves. */
  readonly outcome = input.required<string>();
  readonly lag = input.required<Lag>();
  readonly panelVersionId = input.required<string>();

  protected readonly dropped = computed(() =>
    droppedRows(this.sample().dropped, this.outcome(), this.lag()),
  );
  protected readonly listed = computed(() => this.dropped().slice(0, mostListed));
  protected readonly used = computed(() => {
    const { observations, companies, firstYear, lastYear, balanced } = this.sample();
    const evenness = balanced ? 'each company has every year' : 'not every company has every year';
    return `${counted(observations, 'row')} of ${counted(companies, 'company', 'companies')}, ${yearsText(firstYear, lastYear)}; ${evenness}.`;
  });
  protected readonly droppedWords = computed(() => {
    const rows = this.dropped().length;
    const cell = this.lag() === 0 ? 'a missing cell' : 'a missing cell, or one of the year before';
    return `${counted(rows, 'row')} of these companies dropped out for ${cell}:`;
  });
}
